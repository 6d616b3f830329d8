/**
 * Outlives the command that started it by a moment: when that command ends, in whatever way, the pipe on standard
 * input closes, and everything in the command's record is stopped.
 */
import { stopRecorded } from "./run-record.mjs";

for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM", "SIGHUP"])) process.on(signal, () => undefined);

const recordFile = process.argv[2];
if (!recordFile) throw new Error("The guard needs the path of a record.");
process.stdin.resume();
process.stdin.once("close", () => void stopRecorded(recordFile).then(() => process.exit(0)));
