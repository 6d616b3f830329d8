/**
 * Header value that makes a browser save an answer under a name. The name is said twice: in plain letters for old clients, and
 * whole by RFC 6266.
 */
export function attachment(name: string): string {
  const plain = name.replace(/[^A-Za-z0-9._ -]/g, "_");
  const whole = encodeURIComponent(name).replace(
    /['()*]/g,
    (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `attachment; filename="${plain}"; filename*=UTF-8''${whole}`;
}
