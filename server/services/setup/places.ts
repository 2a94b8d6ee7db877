import { Op } from 'sequelize';
import { AppError, badField, notFound } from '#server/errors.ts';
import { Place } from '#server/models/Place.ts';
import { Van } from '#server/models/Van.ts';

type PlaceInput = Pick<
  Place,
  | 'kind'
  | 'name'
  | 'addressLabel'
  | 'lat'
  | 'lon'
  | 'opensMinutes'
  | 'closesMinutes'
  | 'lengthMinutes'
> & { phone: string | null };

export function listPlaces(): Promise<Place[]> {
  return Place.findAll({
    order: [
      ['kind', 'ASC'],
      ['name', 'ASC'],
    ],
  });
}

export function createPlace(input: PlaceInput): Promise<Place> {
  return Place.create(input);
}

export async function updatePlace(placeId: string, change: Partial<PlaceInput>): Promise<Place> {
  const place = await needPlace(placeId);
  place.set(change);
  if (place.opensMinutes >= place.closesMinutes)
    throw badField('closesMinutes', 'must open before it closes');
  return place.save();
}

export async function removePlace(placeId: string): Promise<void> {
  const place = await needPlace(placeId);
  const van = await Van.findOne({
    where: { [Op.or]: [{ startPlaceId: placeId }, { endPlaceId: placeId }] },
  });
  if (van)
    throw new AppError(
      'alreadyThere',
      `${van.name} starts or ends at ${place.name}. Give the van another place first.`,
    );
  await place.destroy();
}

async function needPlace(placeId: string): Promise<Place> {
  const place = await Place.findByPk(placeId);
  if (!place) throw notFound('place');
  return place;
}
