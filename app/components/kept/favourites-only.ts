/** Filter of a list to what its reader has marked. */
export const FAVOURITES_ONLY = {
  name: "favourites",
  label: "Marked",
  options: [{ value: "mine", label: "My favourites" }],
};
