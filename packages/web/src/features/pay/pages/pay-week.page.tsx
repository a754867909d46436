export function PayWeekPage() {
  return null;
}
