import { Form, useNavigation } from "react-router";

interface Props {
  assessmentId: string;
  /** the changes, as they are posted */
  posted: string;
  /** what is tried, for who does not see where the button stands */
  name: string;
}

/** Copies the flow with a change, assesses the copy and shows both side by side. The flow itself stays as it is. */
export function TryOnCopy({ assessmentId, posted, name }: Props) {
  const { state, formData } = useNavigation();
  const waiting = state !== "idle" && formData?.get("changes") === posted;
  return (
    <Form method="post" action={`/assessments/${assessmentId}/remedies`} className="screen-only">
      <input type="hidden" name="changes" value={posted} />
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
