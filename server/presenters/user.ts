import type { User as UserShown } from '@/schemas/generated/contract';
import type { User } from '@/server/models/user';

/** An account as its owner and administrators see it. */
export const presentUser = (user: User): UserShown => ({
  id: user.id,
  name: user.name,
  email: user.email,
  orcid: user.orcid,
  role: user.role,
  confirmed: user.confirmedAt !== null,
  createdAt: user.createdAt.toISOString(),
});
