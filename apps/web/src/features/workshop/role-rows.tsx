import type { Role } from '@windchest/contracts';
import type { ComponentProps } from 'react';
import { workshopTexts } from '../../config/texts/workshop.js';
import { peopleTexts as texts } from '../../config/texts/workshop-people.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';

export interface RoleRowsProps extends Omit<ComponentProps<typeof RadioRow>, 'label'> {
  roles: readonly Role[];
  /** Where no form keeps it. */
  checkedRole?: Role;
}

/** Roles to choose from, each with what it may do. */
export const RoleRows = ({ roles, checkedRole, ...input }: RoleRowsProps) => (
  <RadioRows legend={texts.role}>
    {roles.map((role) => (
      <RadioRow
        key={role}
        {...input}
        value={role}
        checked={checkedRole === undefined ? undefined : checkedRole === role}
        label={workshopTexts.roles[role]}
        note={texts.rights[role]}
      />
    ))}
  </RadioRows>
);
