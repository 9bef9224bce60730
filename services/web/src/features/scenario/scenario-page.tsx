/** Placeholder until the editor lands. */
export default function ScenarioPage() {
  return null;
}
