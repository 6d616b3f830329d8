import { useEffect, useRef } from "react";
import { Link } from "react-router";
import { ShortcutList } from "./ShortcutList.tsx";

/** The keys of the program, over the page that one is on. */
export default function KeysDialog({ onClose }: { onClose: () => void }) {
  const dialog = useRef<HTMLDialogElement>(null);
  useEffect(() => dialog.current?.showModal(), []);
  const close = () => dialog.current?.close();
  return (
    <dialog
      ref={dialog}
      aria-labelledby="keys-title"
      onClose={onClose}
      onClick={(event) => event.target === dialog.current && close()}
      className="frame m-auto max-h-[84vh] w-[calc(100%-2rem)] max-w-160 text-ink shadow-float backdrop:bg-ink/30"
    >
      <div className="flex items-center gap-4 border-b border-ink p-4">
        <h2 id="keys-title" className="text-lead font-semibold">
          Keys
        </h2>
        <Link to="/preferences" className="link ml-auto" onClick={close}>
          Preferences
        </Link>
        <button type="button" className="btn" onClick={close}>
          Close
        </button>
      </div>
      <div className="p-4">
        <ShortcutList />
      </div>
    </dialog>
  );
}
