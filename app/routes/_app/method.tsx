export function loader() {
  return null;
}
export default function Method() {
  return <h1 className="text-answer">Method</h1>;
}
