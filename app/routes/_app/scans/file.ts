export function loader() {
  return null;
}
