import type { OutputOf, Role } from '@windchest/contracts';
import { useState } from 'react';
import { workshopTexts } from '../../config/texts/workshop.js';
import { peopleTexts as texts } from '../../config/texts/workshop-people.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Text } from '../../ui/text.js';
import { RoleRows } from './role-rows.js';

const roles = Object.keys(workshopTexts.roles) as Role[];

/** Gives a person another role, after asking. One's own role is somebody else's to change. */
export function ChangeRole({ person }: { person: OutputOf<'GET /workshop/people'>['items'][number] }) {
  const { person: self } = useSession();
  const [isAsking, setIsAsking] = useState(false);
  const [role, setRole] = useState<Role>(person.role);
  const { run, fault, reset } = useAction('PATCH /workshop/people/:personId', ['GET /workshop/people']);
  const name = person.name || person.email;
  if (self?.id === person.id) return texts.you;
  const open = () => {
    setRole(person.role);
    reset();
    setIsAsking(true);
  };
  return (
    <>
      <Button
        look="plain"
        size="sm"
        minHeight="1.5rem"
        paddingBlock="0"
        aria-label={texts.changeRoleOf(name)}
        onClick={open}
      >
        {texts.changeRole}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => setIsAsking(false)}
        look="ink"
        title={texts.changeTitle(name)}
        confirmLabel={texts.changeConfirm}
        onConfirm={async () => (await run({ params: { personId: person.id }, body: { role } })).isDone}
      >
        <RoleRows
          roles={roles}
          name={`role-of-${person.id}`}
          onChange={(event) => setRole(event.target.value as Role)}
          checkedRole={role}
        />
        <Text look="small" isSoft marginTop="3">
          {texts.changeNote}
        </Text>
        {fault && <Fault what={texts.changeFailed} fault={fault} />}
      </ConfirmDialog>
    </>
  );
}
