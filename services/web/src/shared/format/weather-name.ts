/** A weather year's name where only text can stand: "Brackenfold (synthetic)". */
export function markedWeatherName({ name, synthetic }: { name: string; synthetic: boolean }): string {
  return synthetic ? `${name} (synthetic)` : name;
}
