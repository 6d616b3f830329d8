import { SHORTCUTS } from "#app/lib/shortcuts.ts";

/** Every key that the program answers, by where it does. */
export function ShortcutList() {
  return SHORTCUTS.map(({ where, keys }) => (
    <section key={where} className="border-t border-line py-3 first:border-0 first:pt-0">
      <h3 className="font-semibold">{where}</h3>
      <dl>
        {keys.map(({ keys: ways, does }) => (
          <div key={does} className="grid gap-x-4 py-1 tablet:grid-cols-[208px_minmax(0,1fr)]">
            <dt>
              {ways.map((way, index) => (
                <span key={way} className="whitespace-nowrap">
                  {index > 0 && <span className="text-quiet">{index === ways.length - 1 ? " or " : ", "}</span>}
                  <kbd className="rounded border border-edge px-1 font-sans text-label">{way}</kbd>
                </span>
              ))}
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
    </section>
  ));
}
