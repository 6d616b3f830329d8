import { CourseChart } from "#app/components/charts/CourseChart.tsx";
import { lyingText } from "#app/lib/course-words.ts";
import { stepsInWords } from "#app/lib/step-numbers.ts";
import type { CourseStep } from "#app/lib/warp-course.ts";

/** Warp along the flow, at 25 °C and at the hottest of each step, with both limits of each step's tool. */
export function FlowCourse({ course, selected }: { course: readonly CourseStep[]; selected: number | undefined }) {
  if (!course.some(({ room }) => room)) return null;
  const rolled = course.flatMap(({ rolled: isRolled, number }) => (isRolled ? [number] : []));
  const held = course.filter(({ room, rolled: isRolled }) => !room && !isRolled).length;
  return (
    <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby="course">
      <h2 id="course" className="mb-2 font-semibold">
        Warp along the flow
      </h2>
      <CourseChart
        data={{
          places: course.map(({ number, title }) => ({ tick: `${number}`, name: `${number}, ${title}` })),
          lines: [
            {
              id: "room",
              label: "25\u00A0°C",
              dash: "solid",
              marker: "circle",
              colourToken: "silicon",
              values: course.map(({ room }) => room),
              band: true,
            },
            {
              id: "peak",
              label: "at peak",
              dash: "chain",
              marker: "square",
              colourToken: "copper",
              values: course.map(({ peak }) => peak),
            },
          ],
          limits: course.map(({ limits }) => limits),
          rolled,
          chosen: selected,
          formatWarp: lyingText,
        }}
        label="Warp along the flow, as it lies on each tool"
        summary={[
          "Band: ± at 25\u00A0°C, k = 2. Short dashes: what the step’s tool takes, edges up and edges down; those far beyond the wafer are left off and stand in the table.",
          held > 0 ? "No line where tape or frame holds the wafer flat." : "",
          rolled.length > 0 ? `Ruled: rolls up at ${stepsInWords(rolled)}, so it has no bow there.` : "",
        ]
          .filter(Boolean)
          .join(" ")}
      />
    </section>
  );
}
