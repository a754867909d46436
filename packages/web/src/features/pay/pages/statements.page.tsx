export function StatementsPage() {
  return null;
}
