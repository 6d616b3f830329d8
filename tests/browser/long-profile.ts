/** A profile over 190 mm of so many rows, bent by 31.6 µm; each row has some 27 bytes. */
export function longProfile(name: string, rows: number) {
  const lines = Array.from({ length: rows }, (_, row) => {
    const x = -95 + (190 * row) / (rows - 1);
    return `${x.toFixed(8)},${(0.0035 * x * x).toFixed(9)}`;
  });
  return {
    name,
    mimeType: "text/csv",
    buffer: Buffer.from(`Position [mm],Height [um]\n${lines.join("\n")}\n# ${name}\n`),
  };
}
