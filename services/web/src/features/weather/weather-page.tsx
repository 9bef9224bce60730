export default function WeatherPage() {
  return null;
}
