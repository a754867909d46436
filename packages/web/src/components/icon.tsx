import sprite from './icons.svg?url&no-inline';

/** An icon of the product's own set; it stands beside a word, so it is hidden from readers. */
export function Icon({ name, className = '', title }: { name: string; className?: string; title?: string }) {
  return (
    <svg className={`ic ${className}`} aria-hidden={title ? undefined : true} role={title ? 'img' : undefined}>
      {title ? <title>{title}</title> : null}
      <use href={`${sprite}#${name}`} />
    </svg>
  );
}

export function Mark({ name, className = '' }: { name: string; className?: string }) {
  return (
    <svg className={`mk ${className}`} aria-hidden>
      <use href={`${sprite}#${name}`} />
    </svg>
  );
}
