export function RatesPage() {
  return null;
}
