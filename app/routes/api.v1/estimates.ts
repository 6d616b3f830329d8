export function loader() {
  return new Response(null, { status: 405 });
}
