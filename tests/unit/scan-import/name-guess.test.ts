import { expect, it } from "vitest";
import { guessFromName } from "#app/lib/scan-import/name-guess.ts";

it.each([
  ["M-0388_az045_post.csv", ["M-0388", "", "", "45", "after"]],
  ["M-0388_lot-L12_s07_az090_before.txt", ["M-0388", "L12", "7", "90", "before"]],
  ["pre M0412 135deg.dat", ["M0412", "", "", "135", "before"]],
  ["L7A_slot 3_after.csv", ["", "L7A", "3", "", "after"]],
  ["monitor-after.csv", ["monitor", "", "", "", "after"]],
  ["az999.csv", ["", "", "", "", ""]],
  ["prepost.csv", ["prepost", "", "", "", ""]],
  ["<img src=x>_pre.csv", ["<img src=x>", "", "", "", "before"]],
])("%s says no more than its name does", (name, [wafer, lot, slot, azimuth, side]) => {
  expect(guessFromName(name)).toEqual({ wafer, lot, slot, azimuth, side });
});
