import { BOLD, mm, PAPER_COLOURS, TYPE, type Kit } from "./kit.ts";

/** Room to write by hand: a label and a rule of its own width, mm. */
export function WriteIn({
  kit,
  label,
  width,
  strong = false,
}: {
  kit: Kit;
  label: string;
  width: number;
  strong?: boolean;
}) {
  const { Box, Text } = kit;
  return (
    <Box style={{ flexDirection: "row", alignItems: "flex-end", columnGap: mm(1.5) }}>
      <Text style={strong ? { ...TYPE.body, ...BOLD } : TYPE.body}>{label}</Text>
      <Box
        style={{
          width: mm(width),
          height: mm(4.6),
          borderBottomWidth: mm(0.2),
          borderColor: PAPER_COLOURS.ink,
          marginBottom: mm(0.6),
        }}
      />
    </Box>
  );
}
