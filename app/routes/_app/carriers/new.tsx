export function loader() {
  return null;
}

export default function Page() {
  return null;
}
