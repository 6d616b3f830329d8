import { SelectField, type Option } from "#app/components/ui/SelectField.tsx";
import { PROGRAM_ROLES, SITE_ROLES } from "#app/policies/roles.ts";
import type { ProgramRoleChoice } from "#app/schemas/person-form.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";
import { ProofFields } from "./ProofFields.tsx";

const options = (values: readonly string[]): Option[] =>
  values.map((value) => ({ value, label: value.charAt(0).toUpperCase() + value.slice(1) }));

interface Props {
  siteRole: string;
  programs: readonly ProgramRoleChoice[];
  /** what was typed before, by the names of the fields */
  typed: Record<string, string> | undefined;
  proofAsked: ProofAsked;
  proofFault: ProofFault | undefined;
}

/** What a person is on the site and in each program, with the proof of who changes it where it is asked for. */
export function RoleFields({ siteRole, programs, typed, proofAsked, proofFault }: Props) {
  return (
    <>
      <SelectField
        name="siteRole"
        label="On the site"
        options={options(SITE_ROLES)}
        blank="No role of the site"
        defaultValue={typed?.["siteRole"] ?? siteRole}
      />
      {programs.map(({ id, name, role }, index) => (
        <div key={id}>
          <input type="hidden" name={`memberships[${index}].program`} value={id} />
          <SelectField
            name={`memberships[${index}].role`}
            label={`In ${name}`}
            options={options(PROGRAM_ROLES)}
            blank="Does not belong to it"
            defaultValue={typed?.[`memberships[${index}].role`] ?? role ?? ""}
          />
        </div>
      ))}
      <ProofFields asked={proofAsked} fault={proofFault} />
    </>
  );
}
