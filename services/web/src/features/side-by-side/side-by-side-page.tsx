/** Placeholder until the comparison lands. */
export default function SideBySidePage() {
  return null;
}
