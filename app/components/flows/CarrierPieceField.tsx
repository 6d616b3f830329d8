import type { FieldMetadata } from "@conform-to/react";
import { useState } from "react";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { PieceChoice, StepChoices } from "#app/lib/flow-step-choices.ts";
import { ExplainedChoiceField } from "./ExplainedChoiceField.tsx";

interface Props {
  carrier: FieldMetadata<string | undefined>;
  piece: FieldMetadata<string | undefined>;
  choices: Pick<StepChoices, "carriers" | "pieces">;
}

/** The carrier of a bond, and which piece of it where that is known already. Only pieces of that carrier are offered. */
export function CarrierPieceField({ carrier, piece, choices: { carriers, pieces } }: Props) {
  const [kind, setKind] = useState(carrier.initialValue ?? "");
  const scripted = useInBrowser();
  const offered = scripted ? pieces.filter((each) => each.carrier === kind) : pieces;
  return (
    <>
      <ExplainedChoiceField
        field={carrier}
        label="Carrier"
        choices={carriers}
        blank="Choose a carrier"
        onChoose={setKind}
      />
      {pieces.length > 0 && <Pieces key={scripted ? kind : ""} field={piece} offered={offered} named={!scripted} />}
    </>
  );
}

function Pieces(props: { field: FieldMetadata<string | undefined>; offered: PieceChoice[]; named: boolean }) {
  const { field, offered, named } = props;
  const [chosen, setChosen] = useState(field.initialValue ?? "");
  const words = offered.find(({ id }) => id === chosen)?.words;
  return (
    <ChoiceField
      field={field}
      label="Piece of the carrier"
      choices={offered.map(({ id, mark, carrierName }) => ({
        value: id,
        label: named ? `${mark}, ${carrierName}` : mark,
      }))}
      blank={offered.length === 0 ? "No piece known" : "Any piece"}
      hint={words ?? "Named: its own uses and thickness variation count"}
      select={{ onChange: (event) => setChosen(event.currentTarget.value) }}
    />
  );
}
