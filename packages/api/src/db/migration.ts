/** A step of the schema. Never edited after it has landed; `down` takes it back whole. */
export interface Migration {
  name: string;
  up: string;
  down: string;
}
