import 'server-only';

import { AppError } from '@/lib/errors';
import type { Role } from '@/lib/schemas/common';
import type { Viewer } from '@/lib/schemas/person';

import type { Context } from './context';

/** What may be done, by whom. Roles are decided here and nowhere else. */
const ROLES_BY_ACTION = {
  read: ['owner', 'analyst', 'reviewer', 'modeller'],
  comment: ['owner', 'analyst', 'reviewer', 'modeller'],
  export: ['owner', 'analyst', 'reviewer', 'modeller'],
  'edit data': ['owner', 'analyst'],
  fit: ['owner', 'analyst'],
  decide: ['owner', 'reviewer'],
  'manage team': ['owner'],
} as const satisfies Record<string, readonly Role[]>;

export type Action = keyof typeof ROLES_BY_ACTION;

const NOT_ALLOWED: Record<Action, string> = {
  read: 'Your role in this team does not allow this.',
  comment: 'Your role in this team does not allow comments.',
  export: 'Your role in this team does not allow exports.',
  'edit data': 'Only analysts and owners may add or change samples, scans and stopping sets.',
  fit: 'Only analysts and owners may make, submit or discard fits.',
  decide: 'Only reviewers and owners may accept or return fits.',
  'manage team': 'Only owners may manage the team.',
};

interface FitStanding {
  createdById: string;
  state: 'draft' | 'submitted' | 'accepted' | 'returned';
}

/** The person who acts, or a refusal. */
export function signedIn(ctx: Context): Viewer {
  if (ctx.viewer === null) throw new AppError('unauthenticated', 'Sign in first.');
  return ctx.viewer;
}

/** The person who acts and whose role allows it, or a refusal. */
export function allow(ctx: Context, action: Action): Viewer {
  const viewer = signedIn(ctx);
  if (!mayAct(viewer, action)) throw new AppError('forbidden', NOT_ALLOWED[action]);
  return viewer;
}

/** A fit goes to review by who made it, or by an owner. */
export function allowSubmit(viewer: Viewer, fit: FitStanding): void {
  if (fit.createdById !== viewer.userId && viewer.role !== 'owner')
    throw new AppError('forbidden', 'Only who made a fit, or an owner, may submit it.');
}

/** Nobody decides on a fit of their own, owners included. */
export function allowDecision(viewer: Viewer, fit: FitStanding): void {
  if (fit.createdById === viewer.userId)
    throw new AppError('forbidden', 'You made this fit; someone else has to decide on it.');
}

export function allowDiscard(viewer: Viewer, fit: FitStanding): void {
  if (fit.createdById !== viewer.userId)
    throw new AppError('forbidden', 'Only who made a draft may discard it.');
}

/** What the viewer may do with a fit now: the same rules, for buttons. */
export function mayWithFit(viewer: Viewer, fit: FitStanding) {
  const own = fit.createdById === viewer.userId;
  const decide = mayAct(viewer, 'decide') && !own && fit.state === 'submitted';
  return {
    submit: mayAct(viewer, 'fit') && (own || viewer.role === 'owner') && fit.state === 'draft',
    accept: decide,
    return: decide,
    comment: mayAct(viewer, 'comment'),
    revise: mayAct(viewer, 'fit'),
    discard: mayAct(viewer, 'fit') && own && fit.state === 'draft',
  };
}

export function mayAct(viewer: Viewer, action: Action): boolean {
  const roles: readonly Role[] = ROLES_BY_ACTION[action];
  return roles.includes(viewer.role);
}
