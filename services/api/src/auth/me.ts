import type { User, Workspace } from '@noonwell/persistence';
import type { Me, Role } from '@noonwell/schema';

type Named = Pick<User, 'id' | 'name' | 'email'>;

export function meView(user: Named, workspace: Pick<Workspace, 'id' | 'name' | 'isDemo'>, role: Role): Me {
  return {
    user: { id: user.id, name: user.name, email: user.email },
    workspace: { id: workspace.id, name: workspace.name, isDemo: workspace.isDemo },
    role,
  };
}
