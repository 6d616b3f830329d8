/** Read before anything is reported. */
export function ShardCaution({ className = "" }: { className?: string }) {
  return (
    <p className={className}>
      If somebody is hurt or in danger, follow the site’s emergency procedure first. Thin silicon breaks into
      razor-sharp shards: eye and hand protection before you touch anything, and leave the pieces to the site’s
      procedure for broken wafers.
    </p>
  );
}
