import { Icon } from '../../../../components/icon.tsx';

/** Takes away everything kept about a person's pay: statements, hours, rates, corrections. */
export function PayRecord({ personId, name, isOwn = false }: { personId: string; name: string; isOwn?: boolean }) {
  return (
    <a
      className="btn"
      href={`/api/pay/people/${personId}/export.zip`}
      download={`pay-of-${name.replaceAll(' ', '-')}.zip`}
    >
      <Icon name="dn" /> {isOwn ? 'Everything kept about your pay' : `Everything kept about this pay`}
    </a>
  );
}
