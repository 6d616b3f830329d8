import { readScanFile } from "./app/lib/scan-reading/scan-reader.ts";
const show = (name: string, text: string | Uint8Array, profile = {}) => {
  const t = performance.now();
  try {
    const r = readScanFile(typeof text === "string" ? new TextEncoder().encode(text) : text, name, profile);
    const { reading } = r;
    console.log(`## ${name} ${(performance.now() - t).toFixed(0)} ms`, r.outcome, reading.kind, JSON.stringify(reading.delimiter), reading.decimalMark, reading.thousands, reading.encoding, "rows", reading.headerRow, reading.unitsRow, reading.firstRow);
    console.log("  ", reading.columns.map((c) => `${c.index}:${c.heading}=${c.role}[${c.unit}] ${c.why}`).join(" | "));
    for (const a of reading.ambiguities) console.log("   ?", a.blocks, a.what, a.column, a.sentence, a.choices.join("/"));
    if (r.outcome === "read") {
      if (r.content.kind === "profiles") console.log("  ", r.content.profiles.map((p) => `${p.name} ${p.along} n=${p.x.length} x0=${p.x[0]} z0=${p.z[0]} ${p.from}..${p.to}`).join(" | "), "rows", r.content.rows, JSON.stringify(r.content.faults), JSON.stringify(r.content.footer));
      else console.log("  ", JSON.stringify(r.content).slice(0, 700));
    }
  } catch (e) {
    console.log(`## ${name} ${(performance.now() - t).toFixed(0)} ms REFUSED`, (e as Error).message, (e as Error).name === "Error" ? "" : (e as Error).stack);
  }
};
const pts = Array.from({ length: 39 }, (_, n) => ({ x: -95 + 5 * n, z: 0.005 * (-95 + 5 * n) ** 2 + Math.sin(n * 7) }));
const rows = (f: (p: { x: number; z: number }, n: number) => string) => pts.map(f).join("\n") + "\n";
const c = (v: number, d: number) => v.toFixed(d).replace(".", ",");
show("plain", "x (mm),z (um)\n" + rows((p) => `${p.x.toFixed(2)},${p.z.toFixed(4)}`));
show("german", "sep=;\nPosition [mm];Höhe [µm]\n" + rows((p) => `${c(p.x, 2)};${c(p.z, 4)}`));
show("nounits", "x,z\n" + rows((p) => `${p.x.toFixed(2)},${p.z.toFixed(4)}`));
show("ambig", "x (mm);z (um)\n" + rows((p, n) => `${n + 1},${String(100 + n)};${n + 3},123`));
show("unitsrow", "Operator;Jude\nDate;03/04/2026\n\nIndex\tPosition\tHeight\n\tmm\tnm\n" + rows((p, n) => `${n + 1}\t${c(p.x, 1)}\t${c(p.z * 1e3, 1)}`) + "End of scan\nMean;3\n");
show("pairs", "x1 (mm),z1 (um),x2 (mm),z2 (um)\n" + rows((p) => `${p.x.toFixed(2)},${p.z.toFixed(4)},${p.x.toFixed(2)},${(2 * p.z).toFixed(4)}`));
show("one pos", "x (mm),pre (um),post (um)\n" + rows((p) => `${p.x.toFixed(2)},${p.z.toFixed(4)},${(2 * p.z).toFixed(4)}`));
show("unheaded", rows((p) => `${p.x.toFixed(2)} ${p.z.toFixed(4)}`));
show("unheaded idx", rows((p, n) => `${n} ${p.x.toFixed(2)} ${p.z.toFixed(4)}`), { units: { position: "mm", height: "µm" } });
show("blanks", "Scan position (mm)   Raw height (um)\n" + rows((p) => `   ${p.x.toFixed(2)}    ${p.z.toFixed(4)}  `));
show("D", "x/m;z/m\n" + rows((p) => `${(p.x / 1e3).toExponential(5).replace("e", "D")};${(p.z / 1e6).toExponential(5).replace("e", "D")}`));
show("quoted", 'x (mm),"z (nm)"\n' + rows((p) => `"${p.x.toFixed(2)}","${Math.round(p.z * 1e3).toLocaleString("en-US")}.5"`));
show("apos", "x (mm);z (nm)\n" + rows((p) => `${p.x.toFixed(2)};${Math.round(p.z * 1e3).toLocaleString("en-US").replaceAll(",", "'")}`));
show("blank thousands", "x (mm)\tz (nm)\n" + rows((p) => `${c(p.x, 2)}\t${Math.round(p.z * 1e3).toLocaleString("en-US").replaceAll(",", " ")},5`));
show("utf16", new Uint8Array(Buffer.from("x (mm)\tz (µm)\n" + rows((p) => `${p.x}\t${p.z.toFixed(3)}`), "utf16le")));
show("1252", new Uint8Array(Buffer.from("x (mm)\tz (\xc5)\n" + rows((p) => `${p.x}\t${(p.z * 1e4).toFixed(3)}`), "latin1")));
show("summary", "Lot;Slot;WaferID;Thk_ctr;TTV;Bow_BF_3mm;Warp-3pt (µm);Sori\n;;;µm;µm;µm;;µm\n" + Array.from({ length: 25 }, (_, n) => `L1;${n + 1};W${n};775,${n};1,2;-${n + 30},5;${n + 60},1;${n + 61},0`).join("\n") + "\nMean;;;775;1;2;3;4\n");
show("map", "Site,X (mm),Y (mm),Thickness (um)\n" + Array.from({ length: 9 }, (_, n) => `${n + 1},${10 * n},${-10 * n},${50 + n / 10}`).join("\n"));
show("polar", "Site,R (mm),Theta (deg),Thk (um)\n" + Array.from({ length: 9 }, (_, n) => `${n + 1},${10 * n},${45 * n},${50 + n / 10}`).join("\n"));
show("stress", "Wafer,R1 (m),R2 (m),Film thickness (A),Modulus (1E11 Pa),Stress (1E9 dyn/cm2)\n" + Array.from({ length: 3 }, (_, n) => `W${n},inf,${-30 - n},10000,1.805,${1.5 + n}`).join("\n"));
show("4 ints", "x,z\n" + rows((p) => `${c(p.x, 2)},${c(p.z + 50, 4)}`));
show("point stated comma file", "x (mm);z (um)\n" + rows((p) => `${c(p.x, 2)};${c(p.z, 4)}`), { decimalMark: "point", units: { position: "mm", height: "µm" } });
show("one col", rows((p) => `${p.z.toFixed(3)}`));
show("formula", "x (mm),z (um)\n" + rows((p, n) => (n === 5 ? '=HYPERLINK("a"),3' : `${p.x},${p.z.toFixed(4)}`)));
show("formula2", "x (mm),z (um)\n" + rows((p, n) => (n === 5 ? "1,@SUM(1+1)*cmd|' /C calc'!A0" : `${p.x},${p.z.toFixed(4)}`)));
show("open quote", 'x (mm),z (um)\n1,"2\n' + rows((p) => `${p.x},${p.z.toFixed(4)}`));
show("open nested", 'x (mm),z (um)\n' + rows((p) => `${p.x},${p.z.toFixed(4)}`) + '1,"' + '"",""'.repeat(800000) + "\n");
show("50 MB line", new Uint8Array(50e6).fill(55));
show("50 MB comma line", new Uint8Array(Buffer.from("1,2,".repeat(12.5e6))));
show("million columns", Array.from({ length: 1e6 }, () => "1").join(",") + "\n");
show("300k columns", (Array.from({ length: 3e5 }, () => "1").join(",") + "\n").repeat(2));
show("proto", "__proto__,constructor\n" + rows((p) => `${p.x},${p.z.toFixed(4)}`));
show("proto2", "x (mm),z (um),__proto__\n" + rows((p) => `${p.x},${p.z.toFixed(4)},3`));
show("1e9", "x (mm),z (um)\n" + rows((p, n) => `${p.x * 1e9},${p.z.toFixed(4)}`));
show("nan", "x (mm),z (um)\n" + "NaN,NaN\n".repeat(300000));
show("nan height", "x (mm),z (um)\n" + Array.from({ length: 300000 }, (_, n) => `${n},NaN\n`).join(""));
show("zip", new Uint8Array([0x50, 0x4b, 3, 4, 1, 2, 3, 4]));
show("quotes soup", "x,z\n" + '"a"b"c '.repeat(100000));
show("desc radius", "Radius (mil);Level (mil)\n" + pts.filter((p) => p.x >= 0).reverse().map((p) => `${(p.x / 0.0254).toFixed(1)};${(p.z / 25.4).toFixed(5)}`).join("\n"));
