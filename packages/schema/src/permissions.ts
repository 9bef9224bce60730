/**
 * Who may do what: the only table of it. The API decides by it, the web hides what it refuses, the
 * documentation prints it.
 */
export const ROLES = ['admin', 'engineer', 'analyst', 'student'] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_LABELS: Readonly<Record<Role, string>> = {
  admin: 'Administrator',
  engineer: 'Engineer',
  analyst: 'Analyst',
  student: 'Student',
};

export const PERMISSIONS = {
  'workspace.read': ['admin', 'engineer', 'analyst', 'student'],
  'members.manage': ['admin'],
  'weather.read': ['admin', 'engineer', 'analyst', 'student'],
  'weather.write': ['admin', 'engineer', 'analyst'],
  /** Studies shared with the workspace. A student's own studies are a sandbox that only the owner and admins see. */
  'study.read': ['admin', 'engineer', 'analyst', 'student'],
  'study.write': ['admin', 'engineer', 'analyst'],
  'sandbox.write': ['admin', 'engineer', 'analyst', 'student'],
  'run.read': ['admin', 'engineer', 'analyst', 'student'],
  'run.write': ['admin', 'engineer', 'analyst', 'student'],
} as const satisfies Record<string, readonly Role[]>;
export type Permission = keyof typeof PERMISSIONS;

export function roleMay(role: Role, permission: Permission): boolean {
  return (PERMISSIONS[permission] as readonly Role[]).includes(role);
}

/** A student's sandbox: so many studies, and so many runs waiting or running at once. */
export const STUDENT_QUOTA = { studies: 10, activeRuns: 4 } as const;
