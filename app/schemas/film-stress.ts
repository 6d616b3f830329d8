/** Whether a value counts. One that is set aside stays where it is, with the reason. */
export type FilmStressState = "accepted" | "set aside";
