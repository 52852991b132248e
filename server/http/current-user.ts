import type { Request } from 'express';
import type { User as UserRow } from '@/server/models/user';

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- the way Express's types are extended
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type -- passport's types name the account User
    interface User extends UserRow {}
  }
}

/** The account that the request is signed in with, or null. */
export const userOf = (req: Request): UserRow | null => (req.user as UserRow | undefined) ?? null;
