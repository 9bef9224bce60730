import { roleMay, type Me, type Permission } from '@noonwell/schema';
import { useSession } from './session.js';

/** The person signed in. Only for pages behind the sign-in. */
export function useMe(): Me {
  const session = useSession();
  if (session.status !== 'signedIn') throw new Error('this part of the app needs somebody signed in');
  return session.me;
}

/** Whether the role of the person signed in holds a permission of the shared table. */
export function useMay(permission: Permission): boolean {
  const session = useSession();
  return session.status === 'signedIn' && roleMay(session.me.role, permission);
}
