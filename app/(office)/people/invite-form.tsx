'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PostedText } from '@/components/ui/posted-field';
import { ROLES } from '@/lib/schemas/roles';
import { inviteAction, type InviteState } from './actions';
import { ROLE_NAMES } from './role-names';

const EMPTY: InviteState = { name: '', email: '', roles: ['inspector'], problems: [], invited: null };
const ROLE_SAYS = {
  owner: 'the firm, its people and its settings',
  office: 'books and delivers; cannot change readings or findings',
  inspector: 'walks, decides, signs and releases',
};

export function InviteForm() {
  const [state, submit, isSending] = useActionState(inviteAction, EMPTY);
  const roleProblem = state.problems.find(({ field }) => field === 'roles');
  return (
    <form action={submit} noValidate className="mt-4 grid gap-5">
      <ErrorSummary problems={state.problems} />
      {state.invited && (
        <p role="status" className="border-y border-ink py-3">
          An invitation is on its way to {state.invited}. It counts for 7 days.
        </p>
      )}
      <PostedText
        label="Full name"
        name="name"
        autoComplete="off"
        defaultValue={state.name}
        problems={state.problems}
      />
      <PostedText
        label="E-mail"
        name="email"
        type="email"
        autoComplete="off"
        defaultValue={state.email}
        problems={state.problems}
      />
      <fieldset id="roles" tabIndex={-1} aria-describedby={roleProblem ? 'roles-problem' : undefined}>
        <legend className="mb-1 text-s font-bold">Roles</legend>
        {roleProblem && (
          <p id="roles-problem" className="text-s font-bold">
            ▲ {roleProblem.says}
          </p>
        )}
        {ROLES.map((role) => (
          <label key={role} className="flex min-h-[44px] items-center gap-3">
            <input
              type="checkbox"
              name="roles"
              value={role}
              defaultChecked={state.roles.includes(role)}
              className="size-5 shrink-0 accent-ink"
            />
            <span>
              {ROLE_NAMES[role]} <span className="text-ink-2">{ROLE_SAYS[role]}</span>
            </span>
          </label>
        ))}
      </fieldset>
      <p>
        <Button weight="solid" type="submit" pending={isSending}>
          Send the invitation
        </Button>
      </p>
    </form>
  );
}
