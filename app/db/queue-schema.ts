/** Schema of graphile-worker's own tables, which it makes and alters itself. */
export const QUEUE_SCHEMA = "graphile_worker";
