export type SignalWord = 'Danger' | 'Warning';

export type Pictogram =
  | 'Exploding bomb'
  | 'Flame'
  | 'Flame over circle'
  | 'Gas cylinder'
  | 'Corrosion'
  | 'Skull and crossbones'
  | 'Exclamation mark'
  | 'Health hazard'
  | 'Environment';

export interface GhsStatement {
  code: string;
  hazard: string;
  category: string;
  /** Word for word. */
  text: string;
  signalWord: SignalWord | null;
  pictogram: Pictogram | null;
  /** Codes of the main precautionary statements. */
  precautions: readonly string[];
}

export interface GhsPrecaution {
  code: string;
  text: string;
  /** False for environmental statements, which the OSHA rule does not ask for. */
  isOsha: boolean;
}
