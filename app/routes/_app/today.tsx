export default function Today() {
  return <h1 className="text-answer">Today</h1>;
}
