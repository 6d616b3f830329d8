import { useState } from "react";
import { saveAsPicture } from "./save-as-picture.ts";

type State = "ready" | "drawing" | "failed";
const WORDS: Record<State, string> = { ready: "PNG", drawing: "Drawing…", failed: "PNG failed, try again" };

interface Props {
  /** address of the drawing */
  drawing: string;
  /** name of the file, without its ending */
  name: string;
}

/** Saves a drawing of the server's as a picture, which the browser makes of it. */
export function PictureButton({ drawing, name }: Props) {
  const [state, setState] = useState<State>("ready");
  const save = async () => {
    setState("drawing");
    try {
      await saveAsPicture(drawing, name);
      setState("ready");
    } catch {
      setState("failed");
    }
  };
  return (
    <button type="button" className="btn" aria-live="polite" disabled={state === "drawing"} onClick={() => void save()}>
      {WORDS[state]}
    </button>
  );
}
