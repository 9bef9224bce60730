export default function StudiesPage() {
  return null;
}
