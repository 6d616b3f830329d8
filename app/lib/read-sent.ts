/** What the server sends the engine in the browser. @throws Error where it refuses or cannot be reached */
export async function readSent<Sent>(path: string): Promise<Sent> {
  const response = await fetch(path, { headers: { Accept: "application/json" } });
  if (!response.ok) throw new Error(`status ${response.status}`);
  return (await response.json()) as Sent;
}

/** How an address says that the server is to work it out: for whoever may not have the inputs. */
export const BY_SERVER = "by=server";

export const byServer = ({ searchParams }: URL): boolean => searchParams.get("by") === "server";
