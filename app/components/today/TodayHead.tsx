/** Title of the page, what waits in one sentence, and as of when. */
export function TodayHead({ sentence, now }: { sentence: string; now: string }) {
  return (
    <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1 py-6">
      <h1 className="min-w-[136px] text-answer font-medium">Today</h1>
      <p className="text-figure">
        {sentence}{" "}
        <time dateTime={now} className="whitespace-nowrap text-quiet">
          {now.slice(0, 10)}, {now.slice(11, 16)} UTC
        </time>
      </p>
    </div>
  );
}
