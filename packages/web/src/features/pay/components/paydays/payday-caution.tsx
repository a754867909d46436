/** When wages are due; place rules may be stricter. */
export function PaydayCaution() {
  return (
    <p className="caution">
      <b>Caution.</b> Wages are due on the regular payday of the period; overtime that could not be worked out by then
      no later than the next payday after it can (29 CFR 778.106). States and towns may be stricter: how often, how soon
      after the week, and at once when somebody leaves. Driprail hands over gross pay; withholding is left to a licensed
      processor. This is not legal advice.
    </p>
  );
}
