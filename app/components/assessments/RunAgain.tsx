import { Form, useNavigation } from "react-router";

/** Assesses the flow once more, as it is now; leads to the new assessment. */
export function RunAgain({ primary = false }: { primary?: boolean }) {
  const running = useNavigation().formData?.get("intent") === "run";
  return (
    <Form method="post">
      <input type="hidden" name="intent" value="run" />
      <button type="submit" className={primary ? "btn btn-primary" : "btn"} disabled={running}>
        {running ? "Running…" : "Run again"}
      </button>
    </Form>
  );
}
