/** Opens the browser's own print window. Without scripts the browser's menu does the same. */
export function PrintButton() {
  return (
    <>
      <button type="button" className="btn btn-primary" onClick={() => window.print()}>
        Print
      </button>
      <noscript>Print with the browser’s own command.</noscript>
    </>
  );
}
