import type { MessageHours, MessageKindDto } from '@driprail/shared/contracts/message-settings.contract';
import { messageKinds } from '@driprail/shared/domain/messages/kinds';
import type { MessageKind } from '@driprail/shared/domain/messages/kinds';
import { ourTemplates } from '@driprail/shared/domain/messages/templates';
import { audit } from '../../db/audit.ts';
import { MessageKindRow, MessageSettings } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict } from '../../http/errors.ts';

export async function readMessageSettings(): Promise<{ hours: MessageHours; kinds: MessageKindDto[] }> {
  const [settings, rows] = await Promise.all([
    MessageSettings.findByPk(1, { rejectOnEmpty: true }),
    MessageKindRow.findAll(),
  ]);
  return {
    hours: hoursOf(settings),
    kinds: messageKinds.map((kind) => toKindDto(kind, rows.find((row) => row.kind === kind) ?? null)),
  };
}

/** @throws 409 when somebody changed them meanwhile */
export function updateMessageHours({ actor, now }: Ctx, next: MessageHours): Promise<MessageHours> {
  return inTransaction(async (tx) => {
    const settings = await MessageSettings.findByPk(1, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
    const before = hoursOf(settings);
    if (before.version !== next.version) throw stale(before);
    await settings.update({ ...next, version: next.version + 1 }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'message_settings', '1', 'changed', { before, after: next });
    return hoursOf(settings);
  });
}

type KindFields = Pick<MessageKindDto, 'isOn' | 'subject' | 'body' | 'text' | 'version'>;

/** Words that are ours are kept as none, so that better ones of ours reach the company. @throws 409 when changed meanwhile */
export function updateMessageKind({ actor, now }: Ctx, kind: MessageKind, next: KindFields): Promise<MessageKindDto> {
  return inTransaction(async (tx) => {
    await MessageKindRow.findOrCreate({ where: { kind }, defaults: { kind }, transaction: tx });
    const row = await MessageKindRow.findByPk(kind, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
    if (row.version !== next.version) throw stale(toKindDto(kind, row));
    const ours = ourTemplates[kind];
    const own = (text: string, our: string) => (text === our ? null : text);
    await row.update(
      {
        ...{ isOn: next.isOn, version: next.version + 1 },
        ...{ subject: own(next.subject, ours.subject), body: own(next.body, ours.body) },
        textBody: own(next.text, ours.text),
      },
      { transaction: tx },
    );
    await audit(tx, { userId: actor.userId, at: now() }, 'message_kind', kind, 'changed', { ...next });
    return toKindDto(kind, row);
  });
}

function toKindDto(kind: MessageKind, row: MessageKindRow | null): MessageKindDto {
  const ours = ourTemplates[kind];
  return {
    ...{ kind, isOn: row?.isOn ?? true, version: row?.version ?? 1 },
    ...{ subject: row?.subject ?? ours.subject, body: row?.body ?? ours.body, text: row?.textBody ?? ours.text },
    isOurs: !row?.subject && !row?.body && !row?.textBody,
  };
}

function hoursOf({ quietFrom, quietTo, reminderAt, feedbackHours, version }: MessageSettings): MessageHours {
  return { quietFrom, quietTo, reminderAt, feedbackHours, version };
}

function stale(current: unknown) {
  return conflict('stale', 'Somebody changed this meanwhile. Look at the newer one and save again.', current);
}
