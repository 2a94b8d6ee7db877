import { forecastPet } from '#shared/grooming/forecastPet.ts';
import { planBOf } from '#shared/grooming/planB.ts';
import type { CoatType, Style } from '#shared/grooming/types.ts';
import { badField, notFound } from '#server/errors.ts';
import { Style as StyleRow } from '#server/models/Style.ts';
import { findStyles, type KnownStyle, known, startingStyles } from './findStyles.ts';

export type StyleInput = Pick<Style, 'name' | 'coats' | 'cuts' | 'finish' | 'services'> & {
  planB: NonNullable<Style['planB']>;
};
export type StyleChange = { [Key in keyof StyleInput]?: StyleInput[Key] | undefined };

/** The starting library, then the business's own by name, retired ones last. */
export async function listStyles(): Promise<KnownStyle[]> {
  const rows = await StyleRow.findAll({
    order: [
      ['retired', 'ASC'],
      ['name', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  return [...startingStyles, ...rows.map(known)];
}

export async function createStyle(
  input: StyleInput & { species: Style['species']; basedOn: string | null },
  now: Date,
): Promise<KnownStyle> {
  if (input.basedOn !== null) {
    const model = (await findStyles([input.basedOn])).get(input.basedOn);
    if (model?.style.species !== input.species)
      throw badField('basedOn', `must be a ${input.species} style from the list, or none`);
  }
  const row = StyleRow.build({ ...input, coats: [...input.coats], services: [...input.services], createdAt: now }); // prettier-ignore
  await settle(row);
  return known(await row.save());
}

/** Booked visits keep the forecast they were booked with. */
export async function updateStyle(styleId: string, change: StyleChange): Promise<KnownStyle> {
  const row = await needOwnStyle(styleId);
  row.set(change as Partial<StyleRow>);
  await settle(row);
  return known(await row.save());
}

/** Retired, or offered again. Pets that have it keep it either way. */
export async function retireStyle(styleId: string, retired: boolean): Promise<KnownStyle> {
  const row = await needOwnStyle(styleId);
  row.set({ retired });
  if (!retired) await settle(row);
  return known(await row.save());
}

async function needOwnStyle(styleId: string): Promise<StyleRow> {
  const found = (await findStyles([styleId])).get(styleId);
  if (found?.source === 'starting')
    throw badField('styleId', 'is a starting style: make a copy and change that');
  const row = found && (await StyleRow.findByPk(styleId, { lock: true }));
  if (!row) throw notFound('style');
  return row;
}

/** Completes plan B and checks what one field alone cannot tell. */
async function settle(row: StyleRow): Promise<void> {
  const strange = row.coats.find((coat) => !coatsOf[row.species].includes(coat));
  if (strange) throw badField('coats', `has ${strange}, which is no coat of a ${row.species}`);
  if (row.services.length === 0 && Object.values(row.cuts).every((cut) => cut.tool === 'leave'))
    throw badField('services', 'must hold something when nothing is cut: a style is some work');
  const others = (await listStyles()).filter((one) => one.style.id !== row.id && !one.retired);
  if (others.some(({ style }) => style.name.toLowerCase() === row.name.toLowerCase()))
    throw badField('name', 'is already a style here');
  const { style } = known(row);
  row.planB = planBOf(style);
  for (const coatType of row.coats) refuseUnworkable(style, coatType);
}

/** A style must have minutes for every coat it says it suits. */
function refuseUnworkable(style: Style, coatType: CoatType): void {
  try {
    forecastPet(
      {
        species: style.species,
        breedId: null,
        weightGrams: style.species === 'cat' ? 4500 : 10_000,
        coatType,
        coatState: { matting: 0, undercoatLoad: 0, soil: 0, lengthTenthsMm: null },
        temperament: 'calm',
        cautions: [],
        firstVisit: false,
        weeksSinceLast: null,
      },
      style,
    );
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw badField('cuts', `give no minutes on a ${coatType} coat: ${error.message}`);
  }
}

const coatsOf: Record<Style['species'], readonly CoatType[]> = {
  dog: ['smooth', 'double', 'curly', 'drop', 'wire', 'combination', 'corded', 'hairless'],
  cat: ['catShort', 'catLong', 'hairless'],
};
