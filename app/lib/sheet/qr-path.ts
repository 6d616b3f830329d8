import { create } from "qrcode";

/** A code as one path over its modules, without the quiet zone; x and y count modules. */
export interface CodePath {
  /** modules on a side */
  size: number;
  path: string;
}

/** The code of an address, at a level of correction that survives a crease (M, 15 %); neighbours in a row are one stretch. */
export function codePath(address: string): CodePath {
  const { size, data } = create(address, { errorCorrectionLevel: "M" }).modules;
  let path = "";
  for (let y = 0; y < size; y += 1) {
    for (let x = 0; x < size; x += 1) {
      let end = x;
      while (end < size && data[y * size + end]) end += 1;
      if (end > x) path += `M${x} ${y}h${end - x}v1h${x - end}z`;
      x = end;
    }
  }
  return { size, path };
}
