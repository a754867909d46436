export function StatementPage() {
  return null;
}
