import { RunPanel } from '../features/run-progress/run-panel.js';
import { StudyPage } from '../features/studies/study-page.js';

/** The study page with what other features put on it: features do not know each other. */
export default function StudyRoute() {
  return <StudyPage renderRunPanel={(study) => <RunPanel study={study} />} />;
}
