export default function WeatherYearPage() {
  return null;
}
