export function PayWorkingPage() {
  return null;
}
