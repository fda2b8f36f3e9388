import { Button } from '@/components/ui/button';
import type { Member } from '@/db/people';
import { ROLES } from '@/lib/schemas/roles';
import { renewInvitationAction, setDisabledAction, setRolesAction, signOutMemberAction } from './actions';
import { ROLE_NAMES } from './role-names';

/** One person: who, which roles, whether the license still runs; what an owner may change folds out below. */
export function MemberRow({ member, canManage, isSelf }: { member: Member; canManage: boolean; isSelf: boolean }) {
  return (
    <li className="grid gap-x-6 gap-y-1 border-b border-hairline py-3 sm:grid-cols-[minmax(0,2fr)_minmax(0,1fr)_minmax(0,1.5fr)_minmax(0,1fr)]">
      <div>
        <p className="font-bold">
          {member.name}
          {isSelf && <span className="font-normal text-ink-2"> (you)</span>}
        </p>
        <p className="text-s break-all text-ink-2">{member.email}</p>
      </div>
      <p>{member.roles.map((role) => ROLE_NAMES[role]).join(', ')}</p>
      <p>{licenseOf(member)}</p>
      <p className={member.state === 'active' ? '' : 'font-bold'}>{STATE_SAYS[member.state]}</p>
      {canManage && <ManageMember member={member} />}
    </li>
  );
}

function ManageMember({ member }: { member: Member }) {
  const id = <input type="hidden" name="membershipId" value={member.membershipId} />;
  return (
    <details className="sm:col-span-4">
      <summary className="inline-flex min-h-[44px] cursor-pointer items-center text-s underline underline-offset-4">
        Change<span className="sr-only"> {member.name}</span>
      </summary>
      <div className="grid gap-4 pb-3">
        <form action={setRolesAction} className="flex flex-wrap items-center gap-x-5 gap-y-2">
          {id}
          <fieldset className="flex flex-wrap items-center gap-x-5">
            <legend className="float-left mr-5 font-bold">Roles</legend>
            {ROLES.map((role) => (
              <label key={role} className="inline-flex min-h-[44px] items-center gap-2">
                <input
                  type="checkbox"
                  name="roles"
                  value={role}
                  defaultChecked={member.roles.includes(role)}
                  className="size-5 accent-ink"
                />
                {ROLE_NAMES[role]}
              </label>
            ))}
          </fieldset>
          <Button type="submit">Save roles</Button>
        </form>
        <div className="flex flex-wrap gap-3">
          {member.state === 'invited' && (
            <form action={renewInvitationAction}>
              {id}
              <Button type="submit">Send the invitation again</Button>
            </form>
          )}
          {member.state === 'active' && (
            <form action={signOutMemberAction}>
              {id}
              <Button type="submit">Sign out everywhere</Button>
            </form>
          )}
          <form action={setDisabledAction}>
            {id}
            <input type="hidden" name="disabled" value={member.state === 'disabled' ? 'no' : 'yes'} />
            <Button type="submit">{member.state === 'disabled' ? 'Let in again' : 'Shut out of the firm'}</Button>
          </form>
        </div>
      </div>
    </details>
  );
}

const STATE_SAYS: Record<Member['state'], string> = {
  active: 'Can sign in',
  invited: 'Invited, has not come yet',
  disabled: 'Shut out',
};

function licenseOf({ roles, licenseNumber, licenseState, licenseExpires }: Member): string {
  if (!licenseNumber) return roles.includes('inspector') ? 'No license number yet' : '';
  const number = `License ${licenseState ? `${licenseState} ` : ''}${licenseNumber}`;
  return licenseExpires ? `${number}, until ${americanDate(licenseExpires)}` : number;
}

function americanDate(day: string): string {
  const [year, month, date] = day.split('-').map(Number);
  return `${month}/${date}/${year}`;
}
