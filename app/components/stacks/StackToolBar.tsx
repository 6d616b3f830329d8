import { StepIcon } from "#app/components/flows/StepIcon.tsx";
import type { Direction } from "#app/lib/undo-key.ts";

export interface StackToolBarProps {
  /** whether there is something to take back and to do again */
  ways: Record<Direction, boolean>;
  onStep: (direction: Direction) => void;
  /** mirrors the device side onto the back; null where it holds no film */
  onMirror: (() => void) | null;
  /** ISO 8601, when what is typed was kept in this browser; null while nothing is */
  keptAt: string | null;
  /** what was done last */
  said: string;
}

/** Undo and redo, what is done to the stack as a whole, and whether what is typed is kept. */
export function StackToolBar({ ways, onStep, onMirror, keptAt, said }: StackToolBarProps) {
  return (
    <div className="screen-only flex min-h-16 flex-wrap items-center gap-2 border-b border-line px-4 py-2 tablet:px-5">
      <StepButton direction="undo" words="Undo" can={ways.undo} onStep={onStep} />
      <StepButton direction="redo" words="Redo" can={ways.redo} onStep={onStep} />
      <button
        type="button"
        className="btn"
        disabled={onMirror === null}
        onClick={() => onMirror?.()}
        title="Puts the films of the device side on the back side in mirrored order, in place of what is there"
      >
        Mirror the device side
      </button>
      <p className="min-w-0 grow basis-full text-label text-quiet tablet:basis-0 tablet:text-right">
        <span role="status" className="line-clamp-2" title={said}>
          {said}
        </span>
        {keptAt !== null && <span className="block">Draft kept {timeOf(keptAt)}</span>}
      </p>
    </div>
  );
}

/** As the clock of the person's wall shows it. */
function timeOf(at: string): string {
  const then = new Date(at);
  return [then.getHours(), then.getMinutes()].map((part) => String(part).padStart(2, "0")).join(":");
}

interface StepProps {
  direction: Direction;
  words: string;
  can: boolean;
  onStep: (direction: Direction) => void;
}

/** It stays in the order of the keyboard when there is nothing left to do, so that the focus does not fall off the page. */
function StepButton({ direction, words, can, onStep }: StepProps) {
  return (
    <button
      type="button"
      className="btn inline-flex items-center gap-1.5 aria-disabled:cursor-default aria-disabled:border-line aria-disabled:text-quiet"
      aria-disabled={can ? undefined : true}
      title={direction === "undo" ? "Ctrl Z" : "Ctrl Shift Z"}
      onClick={can ? () => onStep(direction) : undefined}
    >
      <StepIcon kind={direction} />
      {words}
    </button>
  );
}
