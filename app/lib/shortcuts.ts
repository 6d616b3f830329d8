/** Keys and what they do. Each entry of `keys` is one way to press it, its keys joined by a blank. */
export interface Shortcut {
  keys: readonly string[];
  does: string;
}

/** Every key that the program answers beyond those of the browser, by where it does. */
export const SHORTCUTS: readonly { where: string; keys: readonly Shortcut[] }[] = [
  {
    where: "Everywhere",
    keys: [
      { keys: ["Ctrl K", "Cmd K"], does: "Search everything" },
      { keys: ["?"], does: "Show these keys; outside of fields, and only where your preferences allow single keys" },
    ],
  },
  {
    where: "In the search",
    keys: [
      { keys: ["Down", "Up"], does: "Choose the next or the previous line" },
      { keys: ["Enter"], does: "Open the chosen line" },
      { keys: ["Escape"], does: "Leave the search" },
    ],
  },
  {
    where: "In the steps of a flow",
    keys: [
      { keys: ["Alt Up", "Alt Down"], does: "Move the step of the row up or down" },
      { keys: ["Ctrl Z", "Cmd Z"], does: "Take the last change back" },
      { keys: ["Ctrl Shift Z", "Cmd Shift Z", "Ctrl Y"], does: "Do it again" },
      { keys: ["Escape"], does: "Let go of a row that is being dragged" },
    ],
  },
  {
    where: "In the drawing of a stack",
    keys: [
      { keys: ["Up", "Down"], does: "Go to the layer above or below" },
      { keys: ["Enter", "Space"], does: "Select the layer" },
    ],
  },
  {
    where: "In the films of a stack",
    keys: [
      { keys: ["Alt Up", "Alt Down"], does: "Move the film up or down" },
      { keys: ["Ctrl Z", "Cmd Z"], does: "Take the last change back" },
      { keys: ["Ctrl Shift Z", "Cmd Shift Z", "Ctrl Y"], does: "Do it again" },
    ],
  },
  {
    where: "Under a chart",
    keys: [{ keys: ["Left", "Right"], does: "Move the cursor, which reads out the figures where it stands" }],
  },
  {
    where: "Under a map of a stack",
    keys: [{ keys: ["Left", "Right", "Up", "Down"], does: "Move the place that is read out" }],
  },
];
