import type { StudyView } from '@noonwell/schema';
import type { ReactNode } from 'react';
export function StudyPage(_props: { renderRunPanel: (study: StudyView) => ReactNode }) {
  return null;
}
