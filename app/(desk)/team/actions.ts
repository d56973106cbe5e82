'use server';

import { formAction } from '@/app/_server/form-action';
import { cancelInvitation } from '@/db/access/team/cancel-invitation';
import { changeRole } from '@/db/access/team/change-role';
import { invitePerson } from '@/db/access/team/invite-person';
import { removePerson } from '@/db/access/team/remove-person';
import { switchTeam } from '@/db/access/team/switch-team';

export const invitePersonAction = formAction(invitePerson);
export const cancelInvitationAction = formAction(cancelInvitation);
export const changeRoleAction = formAction(changeRole);
export const removePersonAction = formAction(removePerson);
/** The page that one was on may belong to the other team. */
export const switchTeamAction = formAction(switchTeam, { redirectTo: () => '/' });
