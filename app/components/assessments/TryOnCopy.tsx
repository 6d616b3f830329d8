import { Form, useNavigation } from "react-router";

interface Props {
  /** what it is tried on */
  head: { id: string; leg: { number: number } | null };
  /** the changes, as they are posted */
  posted: string;
  /** what is tried, for who does not see where the button stands */
  name: string;
}

/** Copies the flow with a change, assesses the copy and shows both side by side. The flow itself stays as it is. */
export function TryOnCopy({ head, posted, name }: Props) {
  const { state, formData } = useNavigation();
  const waiting = state !== "idle" && formData?.get("changes") === posted;
  return (
    <Form method="post" action={`/assessments/${head.id}/remedies`} className="screen-only">
      <input type="hidden" name="changes" value={posted} />
      {head.leg && <input type="hidden" name="leg" value={head.leg.number} />}
      <button
        type="submit"
        className="btn whitespace-nowrap"
        disabled={waiting}
        aria-label={waiting ? undefined : `Try on a copy: ${name}`}
      >
        {waiting ? "Trying" : "Try on a copy"}
      </button>
    </Form>
  );
}
