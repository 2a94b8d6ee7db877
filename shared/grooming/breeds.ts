import type { BreedFacts, CoatType, HeadShape, Region } from './types.ts';

// Styles and body extras that many rows share. Above the table because it is built at once.
const curly = ['teddy', 'short-all-over', 'scissored-curly', 'clean-face-and-feet'];
const drop = ['teddy', 'short-all-over', 'long-coat-kept', 'longer-all-over'];
const terrier = [
  'terrier-jacket-clipped',
  'terrier-jacket-stripped',
  'short-all-over',
  'jacket-rolled',
];
const spaniel = ['spaniel-outline', 'short-all-over', 'feather-tidy'];
const setter = ['feather-tidy', 'spaniel-outline', 'bath-and-brush'];
const double = ['bath-and-deshed', 'bath-and-brush', 'feet-and-sanitary', 'outline-tidied'];
const smooth = ['bath-and-brush', 'bath-and-deshed', 'nails-and-ears', 'bath-brush-and-teeth'];
const tidyOnly = ['bath-and-brush', 'feet-and-sanitary'];
const plume: Extras = { regionPermille: { tail: 6000 } };
const longHead: Extras = { headShape: 'long' };
const bigEars: Extras = { regionPermille: { ears: 2500 } };

/**
 * Breeds and varieties met in vans. Facts only.
 *
 * Sources: FCI numbers from the FCI nomenclature (checked in `tests/breedTables.test.ts` when the
 * list is at hand); adult weights and coat types are common knowledge written down from memory and
 * checked against the mean weights of Jones et al., Genetics 179 (2008). FCI number 172 (poodle),
 * 148 (dachshund) and 97 (spitz) cover several varieties; they are rows of their own because weight
 * and coat, not the number, decide the minutes. Crosses have wide ranges on purpose: ask the weight.
 */
export const breeds: readonly BreedFacts[] = [
  // Curly
  dog('poodle-toy', 'Poodle, toy', 172, 2.2, 4.2, 'curly', curly),
  dog('poodle-miniature', 'Poodle, miniature', 172, 5, 9, 'curly', curly),
  dog('poodle-medium', 'Poodle, medium', 172, 9, 15, 'curly', curly),
  dog('poodle-standard', 'Poodle, standard', 172, 19, 32, 'curly', curly),
  dog('bichon-frise', 'Bichon frise', 215, 4.5, 8, 'curly', ['scissored-curly', 'teddy']),
  dog('bedlington-terrier', 'Bedlington terrier', 9, 7.5, 11, 'curly', ['lamb-legs', 'teddy']),
  dog('kerry-blue-terrier', 'Kerry blue terrier', 3, 14, 19, 'curly', ['lamb-legs', 'teddy']),
  dog('portuguese-water-dog', 'Portuguese water dog', 37, 16, 27, 'curly', curly),
  dog('spanish-water-dog', 'Spanish water dog', 336, 14, 22, 'curly', ['short-all-over', 'teddy']),
  dog('lagotto', 'Romagna water dog (lagotto)', 298, 11, 16, 'curly', ['teddy', 'short-all-over']),
  dog('irish-water-spaniel', 'Irish water spaniel', 124, 22, 31, 'curly', curly),
  dog('curly-coated-retriever', 'Curly-coated retriever', 110, 28, 42, 'curly', tidyOnly),
  dog('black-russian-terrier', 'Black Russian terrier', 327, 45, 60, 'curly', [
    'scissored-curly',
    'terrier-jacket-clipped',
  ]),
  dog('bouvier-des-flandres', 'Bouvier des Flandres', 191, 30, 45, 'curly', [
    'scissored-curly',
    'short-all-over',
  ]),
  dog('labradoodle', 'Labradoodle', null, 15, 32, 'curly', curly),
  dog('goldendoodle', 'Goldendoodle', null, 15, 34, 'curly', curly),
  dog('goldendoodle-mini', 'Goldendoodle, small', null, 8, 16, 'curly', curly),
  dog('bernedoodle', 'Bernedoodle', null, 25, 42, 'curly', curly),
  dog('sheepadoodle', 'Sheepadoodle', null, 25, 38, 'curly', curly),
  dog('cockapoo', 'Cockapoo', null, 5, 12, 'curly', curly),
  dog('cavapoo', 'Cavapoo', null, 4, 9, 'curly', curly),
  dog('maltipoo', 'Maltipoo', null, 2.5, 6.5, 'curly', curly),
  dog('schnoodle', 'Schnoodle', null, 5, 13, 'curly', curly),
  dog('poochon', 'Bichon × poodle', null, 3.5, 8, 'curly', curly),
  dog('barbet', 'Barbet (French water dog)', 105, 17, 28, 'curly', curly),
  dog('pumi', 'Pumi', 56, 8, 15, 'curly', ['teddy', 'short-all-over'], { undercoat: true }),
  dog('american-water-spaniel', 'American water spaniel', 301, 12, 21, 'curly', curly),
  dog('labradoodle-mini', 'Labradoodle, small', null, 7, 15, 'curly', curly),
  dog('aussiedoodle', 'Aussiedoodle', null, 11, 30, 'curly', curly),
  dog('whoodle', 'Wheaten terrier × poodle', null, 8, 20, 'curly', curly),
  dog('newfypoo', 'Newfoundland × poodle', null, 30, 60, 'curly', curly),
  dog('westiepoo', 'West Highland terrier × poodle', null, 5, 11, 'curly', curly),
  dog('jackapoo', 'Jack Russell terrier × poodle', null, 5, 12, 'curly', curly),

  // Drop: long, falling, keeps growing
  dog('shih-tzu', 'Shih Tzu', 208, 4.5, 8, 'drop', drop, { shortNosed: true }),
  dog('lhasa-apso', 'Lhasa apso', 227, 5, 8.5, 'drop', drop),
  dog('maltese', 'Maltese', 65, 2.5, 4.5, 'drop', drop),
  dog('yorkshire-terrier', 'Yorkshire terrier', 86, 2, 3.8, 'drop', drop),
  dog('silky-terrier', 'Australian silky terrier', 236, 3.5, 5, 'drop', drop),
  dog('havanese', 'Havanese', 250, 3.8, 6, 'drop', drop),
  dog('bolognese', 'Bolognese', 196, 2.5, 4.5, 'drop', drop),
  dog('coton-de-tulear', 'Coton de Tulear', 283, 3.8, 6.5, 'drop', drop),
  dog('skye-terrier', 'Skye terrier', 75, 11, 17, 'drop', drop),
  dog('tibetan-terrier', 'Tibetan terrier', 209, 9, 14, 'drop', drop),
  dog('wheaten-terrier', 'Soft-coated wheaten terrier', 40, 14, 20, 'drop', [
    'teddy',
    'terrier-jacket-clipped',
  ]),
  dog(
    'afghan-hound',
    'Afghan hound',
    228,
    22,
    32,
    'drop',
    ['long-coat-kept', 'bath-and-brush'],
    longHead,
  ),
  dog('bearded-collie', 'Bearded collie', 271, 18, 30, 'drop', drop, { undercoat: true }),
  dog('old-english-sheepdog', 'Old English sheepdog', 16, 27, 42, 'drop', drop, {
    undercoat: true,
  }),
  dog('briard', 'Briard', 113, 27, 42, 'drop', drop, { undercoat: true }),
  dog('polish-lowland-sheepdog', 'Polish lowland sheepdog', 251, 14, 22, 'drop', drop, {
    undercoat: true,
  }),
  dog('lowchen', 'Little lion dog (Löwchen)', 233, 4, 8, 'drop', drop),
  dog('biewer', 'Biewer terrier', null, 1.8, 3.6, 'drop', drop, { unlisted: true }),
  dog('shih-poo', 'Shih Tzu × poodle', null, 3.5, 8, 'drop', drop),
  dog('morkie', 'Maltese × Yorkshire terrier', null, 2, 5, 'drop', drop),
  dog('cesky-terrier', 'Cesky terrier', 246, 6, 10, 'drop', ['short-all-over', 'teddy']),
  dog('chinese-crested-powderpuff', 'Chinese crested dog, powderpuff', 288, 3.2, 5.5, 'drop', drop),
  dog('yorkiepoo', 'Yorkshire terrier × poodle', null, 2, 5.5, 'drop', drop),
  dog('cavachon', 'Cavalier × bichon', null, 5, 9, 'drop', drop),
  dog('zuchon', 'Shih Tzu × bichon', null, 4, 8, 'drop', drop),

  // Wire
  dog('miniature-schnauzer', 'Miniature schnauzer', 183, 5, 9, 'wire', [
    'bearded-outline',
    'terrier-jacket-stripped',
  ]),
  dog('standard-schnauzer', 'Schnauzer', 182, 14, 20, 'wire', [
    'bearded-outline',
    'terrier-jacket-stripped',
  ]),
  dog('giant-schnauzer', 'Giant schnauzer', 181, 26, 42, 'wire', [
    'bearded-outline',
    'terrier-jacket-stripped',
  ]),
  dog('west-highland-terrier', 'West Highland white terrier', 85, 6.5, 9.8, 'wire', terrier),
  dog('scottish-terrier', 'Scottish terrier', 73, 8.5, 10.5, 'wire', terrier),
  dog('cairn-terrier', 'Cairn terrier', 4, 5.5, 7.5, 'wire', terrier),
  dog('border-terrier', 'Border terrier', 10, 5.2, 7.5, 'wire', terrier),
  dog('norfolk-terrier', 'Norfolk terrier', 272, 4.5, 6, 'wire', terrier),
  dog('norwich-terrier', 'Norwich terrier', 72, 4.5, 6, 'wire', terrier),
  dog('wire-fox-terrier', 'Fox terrier, wire', 169, 6.8, 9, 'wire', terrier),
  dog('welsh-terrier', 'Welsh terrier', 78, 8.5, 10, 'wire', terrier),
  dog('lakeland-terrier', 'Lakeland terrier', 70, 6.8, 8.5, 'wire', terrier),
  dog('irish-terrier', 'Irish terrier', 139, 11, 13.5, 'wire', terrier),
  dog('airedale-terrier', 'Airedale terrier', 7, 20, 30, 'wire', terrier),
  dog('australian-terrier', 'Australian terrier', 8, 5, 7, 'wire', terrier),
  dog('sealyham-terrier', 'Sealyham terrier', 74, 8, 11.5, 'wire', terrier),
  dog('affenpinscher', 'Affenpinscher', 186, 3, 5, 'wire', terrier, { shortNosed: true }),
  dog('brussels-griffon', 'Brussels griffon', 80, 3.2, 5.5, 'wire', terrier, { shortNosed: true }),
  dog('dachshund-wire', 'Dachshund, wire-haired', 148, 7, 12, 'wire', terrier),
  dog(
    'dachshund-wire-miniature',
    'Dachshund, wire-haired miniature',
    148,
    3.8,
    5.5,
    'wire',
    terrier,
  ),
  dog('jack-russell-rough', 'Jack Russell terrier, rough', 345, 5, 8, 'wire', terrier),
  dog('german-wirehaired-pointer', 'German wire-haired pointer', 98, 25, 34, 'wire', tidyOnly),
  dog('spinone', 'Italian spinone', 165, 28, 39, 'wire', ['bath-and-brush', 'feather-tidy']),
  dog('irish-wolfhound', 'Irish wolfhound', 160, 45, 70, 'wire', tidyOnly),
  dog('parson-russell-terrier', 'Parson Russell terrier', 339, 6, 8.5, 'wire', terrier),
  dog('dandie-dinmont-terrier', 'Dandie Dinmont terrier', 168, 8, 11, 'wire', terrier),
  dog('glen-of-imaal-terrier', 'Glen of Imaal terrier', 302, 14, 17, 'wire', terrier),
  dog('petit-basset-griffon', 'Petit basset griffon Vendéen', 67, 11, 18, 'wire', tidyOnly),
  dog('korthals-griffon', 'Wire-haired pointing griffon (Korthals)', 107, 20, 30, 'wire', tidyOnly),
  dog('scottish-deerhound', 'Scottish deerhound', 164, 34, 50, 'wire', tidyOnly, longHead),
  dog('otterhound', 'Otterhound', 294, 34, 52, 'wire', tidyOnly),

  // Combination: short jacket with feathers, or long silky with a plain back
  dog('cavalier', 'Cavalier King Charles spaniel', 136, 5.4, 9, 'combination', spaniel, {
    shortNosed: true,
    regionPermille: { ears: 2000, tail: 5000 },
  }),
  dog('english-cocker', 'English cocker spaniel', 5, 12, 15.5, 'combination', spaniel, bigEars),
  dog('american-cocker', 'American cocker spaniel', 167, 9.5, 14, 'combination', spaniel, bigEars),
  dog('springer-spaniel', 'English springer spaniel', 125, 18, 26, 'combination', spaniel, bigEars),
  dog('welsh-springer', 'Welsh springer spaniel', 126, 16, 22, 'combination', spaniel, bigEars),
  dog('clumber-spaniel', 'Clumber spaniel', 109, 25, 38, 'combination', spaniel, bigEars),
  dog('brittany', 'Brittany spaniel', 95, 14, 19, 'combination', spaniel),
  dog('irish-setter', 'Irish red setter', 120, 26, 34, 'combination', setter, plume),
  dog('english-setter', 'English setter', 2, 24, 36, 'combination', setter, plume),
  dog('gordon-setter', 'Gordon setter', 6, 24, 36, 'combination', setter, plume),
  dog('papillon', 'Papillon', 77, 2.5, 5, 'combination', ['bath-and-brush', 'feather-tidy'], plume),
  dog('dachshund-long', 'Dachshund, long-haired', 148, 6.5, 11, 'combination', setter),
  dog(
    'dachshund-long-miniature',
    'Dachshund, long-haired miniature',
    148,
    3.8,
    5.5,
    'combination',
    setter,
  ),
  dog('japanese-chin', 'Japanese chin', 206, 2.5, 5, 'combination', setter, {
    ...plume,
    shortNosed: true,
  }),
  dog('borzoi', 'Borzoi', 193, 30, 46, 'combination', setter, {
    ...plume,
    ...longHead,
  }),
  dog('saluki', 'Saluki', 269, 18, 27, 'combination', tidyOnly, longHead),
  dog('field-spaniel', 'Field spaniel', 123, 17, 25, 'combination', spaniel, bigEars),
  dog('sussex-spaniel', 'Sussex spaniel', 127, 16, 23, 'combination', spaniel, bigEars),
  dog('boykin-spaniel', 'Boykin spaniel', null, 11, 18, 'combination', spaniel, {
    ...bigEars,
    unlisted: true,
  }),
  dog('king-charles-spaniel', 'King Charles spaniel', 128, 3.6, 6.5, 'combination', spaniel, {
    shortNosed: true,
    regionPermille: { ears: 2000, tail: 4000 },
  }),
  dog(
    'irish-red-white-setter',
    'Irish red and white setter',
    330,
    22,
    34,
    'combination',
    setter,
    plume,
  ),
  dog('kooikerhondje', 'Nederlandse kooikerhondje', 314, 9, 14, 'combination', setter, plume),
  dog('large-munsterlander', 'Large Munsterlander', 118, 25, 34, 'combination', setter, plume),
  dog(
    'chihuahua-long',
    'Chihuahua, long-haired',
    218,
    1.5,
    3,
    'combination',
    ['bath-and-brush', 'feather-tidy'],
    plume,
  ),
  dog('russian-toy-long', 'Russian toy, long-haired', 352, 1.4, 3, 'combination', [
    'bath-and-brush',
    'feather-tidy',
  ]),

  // Double
  dog('golden-retriever', 'Golden retriever', 111, 25, 36, 'double', ['feather-tidy', ...double], {
    regionPermille: { tail: 6000 },
  }),
  dog('labrador', 'Labrador retriever', 122, 25, 36, 'double', double),
  dog('flat-coated-retriever', 'Flat-coated retriever', 121, 25, 36, 'double', [
    'feather-tidy',
    ...double,
  ]),
  dog('german-shepherd', 'German shepherd dog', 166, 25, 40, 'double', double),
  dog('belgian-shepherd', 'Belgian shepherd dog', 15, 22, 34, 'double', double),
  dog('border-collie', 'Border collie', 297, 15, 24, 'double', double, plume),
  dog('rough-collie', 'Collie, rough', 156, 22, 33, 'double', double, {
    ...plume,
    ...longHead,
  }),
  dog('shetland-sheepdog', 'Shetland sheepdog', 88, 6.5, 12, 'double', double, plume),
  dog('australian-shepherd', 'Australian shepherd', 342, 18, 30, 'double', double),
  dog('australian-cattle-dog', 'Australian cattle dog', 287, 15, 22, 'double', double),
  dog('corgi-pembroke', 'Welsh corgi, Pembroke', 39, 10, 14, 'double', double),
  dog('corgi-cardigan', 'Welsh corgi, Cardigan', 38, 11, 17, 'double', double),
  dog('siberian-husky', 'Siberian husky', 270, 16, 27, 'double', double, plume),
  dog('alaskan-malamute', 'Alaskan malamute', 243, 32, 43, 'double', double, plume),
  dog('samoyed', 'Samoyed', 212, 17, 30, 'double', double, plume),
  dog('akita', 'Akita', 255, 30, 48, 'double', double),
  dog('shiba', 'Shiba', 257, 8, 12, 'double', double),
  dog('chow-chow', 'Chow chow', 205, 21, 32, 'double', double, { ...plume, shortNosed: true }),
  dog('pomeranian', 'Pomeranian', 97, 1.8, 3.5, 'double', ['feather-tidy', ...double], plume),
  dog('keeshond', 'Keeshond', 97, 16, 25, 'double', double, plume),
  dog('japanese-spitz', 'Japanese spitz', 262, 5, 10, 'double', double, plume),
  dog('pekingese', 'Pekingese', 207, 3.2, 5.5, 'double', ['feather-tidy', ...double], {
    ...plume,
    shortNosed: true,
  }),
  dog('tibetan-spaniel', 'Tibetan spaniel', 231, 4, 7, 'double', double, plume),
  dog('schipperke', 'Schipperke', 83, 4.5, 8.5, 'double', double),
  dog('bernese', 'Bernese mountain dog', 45, 34, 52, 'double', double, plume),
  dog('newfoundland', 'Newfoundland', 50, 48, 70, 'double', double, plume),
  dog('leonberger', 'Leonberger', 145, 45, 72, 'double', double, plume),
  dog('saint-bernard', 'St. Bernard', 61, 54, 84, 'double', double),
  dog('pyrenean-mountain-dog', 'Pyrenean mountain dog', 137, 38, 55, 'double', double, plume),
  dog('rottweiler', 'Rottweiler', 147, 38, 56, 'double', double),
  dog('chesapeake-bay-retriever', 'Chesapeake Bay retriever', 263, 25, 37, 'double', double),
  dog('toller', 'Nova Scotia duck tolling retriever', 312, 16, 23, 'double', double),
  dog('american-akita', 'American Akita', 344, 38, 58, 'double', double),
  dog('belgian-malinois', 'Belgian shepherd dog, Malinois', 15, 24, 36, 'double', double),
  dog('dutch-shepherd', 'Dutch shepherd dog', 223, 20, 32, 'double', double),
  dog('white-swiss-shepherd', 'White Swiss shepherd dog', 347, 25, 40, 'double', double, plume),
  dog('hovawart', 'Hovawart', 190, 25, 45, 'double', double, plume),
  dog('landseer', 'Landseer', 226, 50, 75, 'double', double, plume),
  dog('greater-swiss-mountain-dog', 'Greater Swiss mountain dog', 58, 42, 64, 'double', double),
  dog('entlebucher', 'Entlebuch cattle dog', 47, 20, 30, 'double', double),
  dog('tibetan-mastiff', 'Tibetan mastiff', 230, 34, 70, 'double', double, plume),
  dog('kuvasz', 'Kuvasz', 54, 32, 52, 'double', double, plume),
  dog('maremma', 'Maremma sheepdog', 201, 30, 45, 'double', double, plume),
  dog('kangal', 'Kangal shepherd dog', 331, 40, 63, 'double', double),
  dog(
    'spitz-small',
    'German spitz, small',
    97,
    5,
    10,
    'double',
    ['feather-tidy', ...double],
    plume,
  ),
  dog('volpino', 'Italian volpino', 195, 3.5, 5.5, 'double', ['feather-tidy', ...double], plume),
  dog('eurasier', 'Eurasier', 291, 18, 32, 'double', double, plume),
  dog('finnish-lapphund', 'Finnish lapphund', 189, 15, 24, 'double', double, plume),
  dog('icelandic-sheepdog', 'Icelandic sheepdog', 289, 9, 14, 'double', double, plume),
  dog('norwegian-elkhound', 'Norwegian elkhound', 242, 20, 28, 'double', double),
  dog('swedish-vallhund', 'Swedish vallhund', 14, 9, 14, 'double', double),
  dog('australian-kelpie', 'Australian kelpie', 293, 14, 20, 'double', double),
  dog('miniature-american-shepherd', 'Miniature American shepherd', 367, 9, 18, 'double', double),
  dog('mudi', 'Mudi', 238, 8, 13, 'double', double),
  dog('pomsky', 'Pomeranian × husky', null, 7, 15, 'double', double, plume),

  // Smooth
  dog('pug', 'Pug', 253, 6, 9, 'smooth', smooth, { undercoat: true, shortNosed: true }),
  dog('french-bulldog', 'French bulldog', 101, 9, 15, 'smooth', smooth, { shortNosed: true }),
  dog('bulldog', 'Bulldog', 149, 20, 26, 'smooth', smooth, { shortNosed: true }),
  dog('boston-terrier', 'Boston terrier', 140, 6, 11.5, 'smooth', smooth, { shortNosed: true }),
  dog('boxer', 'Boxer', 144, 25, 34, 'smooth', smooth, { shortNosed: true }),
  dog('beagle', 'Beagle', 161, 9, 15, 'smooth', smooth, { undercoat: true }),
  dog('basset-hound', 'Basset hound', 163, 18, 28, 'smooth', smooth, {
    regionPermille: { ears: 2500 },
  }),
  dog('chihuahua', 'Chihuahua, smooth', 218, 1.5, 3, 'smooth', smooth),
  dog('dachshund-smooth', 'Dachshund, smooth-haired', 148, 7, 11, 'smooth', smooth, longHead),
  dog(
    'dachshund-smooth-miniature',
    'Dachshund, smooth-haired miniature',
    148,
    3.5,
    5.5,
    'smooth',
    smooth,
  ),
  dog('jack-russell-smooth', 'Jack Russell terrier, smooth', 345, 5, 8, 'smooth', smooth),
  dog('staffordshire-bull-terrier', 'Staffordshire bull terrier', 76, 11, 23, 'smooth', smooth),
  dog('bull-terrier', 'Bull terrier', 11, 20, 34, 'smooth', smooth, longHead),
  dog('dalmatian', 'Dalmatian', 153, 20, 32, 'smooth', smooth),
  dog('dobermann', 'Dobermann', 143, 30, 43, 'smooth', smooth, longHead),
  dog('great-dane', 'Great Dane', 235, 48, 80, 'smooth', smooth),
  dog('greyhound', 'Greyhound', 158, 25, 36, 'smooth', smooth, longHead),
  dog('whippet', 'Whippet', 162, 8.5, 16, 'smooth', smooth, longHead),
  dog('italian-greyhound', 'Italian greyhound', 200, 3, 5.5, 'smooth', smooth, longHead),
  dog('vizsla', 'Hungarian vizsla', 57, 18, 29, 'smooth', smooth),
  dog('weimaraner', 'Weimaraner', 99, 23, 38, 'smooth', smooth),
  dog('rhodesian-ridgeback', 'Rhodesian ridgeback', 146, 30, 42, 'smooth', smooth),
  dog('miniature-pinscher', 'Miniature pinscher', 185, 3.5, 5.5, 'smooth', smooth),
  dog('shar-pei', 'Shar Pei', 309, 18, 28, 'smooth', smooth, { shortNosed: true }),
  dog('mastiff', 'Mastiff', 264, 60, 95, 'smooth', smooth, { shortNosed: true }),
  dog('german-shorthaired-pointer', 'German short-haired pointer', 119, 21, 32, 'smooth', smooth),
  dog('basenji', 'Basenji', 43, 9, 12, 'smooth', smooth),
  dog('english-pointer', 'English pointer', 1, 20, 34, 'smooth', smooth),
  dog('bloodhound', 'Bloodhound', 84, 36, 50, 'smooth', smooth, { regionPermille: { ears: 2500 } }),
  dog('bullmastiff', 'Bullmastiff', 157, 45, 62, 'smooth', smooth, { shortNosed: true }),
  dog('dogue-de-bordeaux', 'Dogue de Bordeaux', 116, 45, 65, 'smooth', smooth, {
    shortNosed: true,
  }),
  dog('cane-corso', 'Cane corso', 343, 40, 52, 'smooth', smooth),
  dog('american-staffordshire', 'American Staffordshire terrier', 286, 18, 30, 'smooth', smooth),
  dog('miniature-bull-terrier', 'Miniature bull terrier', 359, 9, 16, 'smooth', smooth, longHead),
  dog('manchester-terrier', 'Manchester terrier', 71, 5.5, 10, 'smooth', smooth, longHead),
  dog('fox-terrier-smooth', 'Fox terrier, smooth', 12, 6.8, 8.5, 'smooth', smooth, longHead),
  dog('lancashire-heeler', 'Lancashire heeler', 360, 4.5, 8, 'smooth', smooth, { undercoat: true }),
  dog('german-pinscher', 'German pinscher', 184, 13, 20, 'smooth', smooth),
  dog('ibizan-hound', 'Ibizan hound (podenco)', 89, 19, 27, 'smooth', smooth, longHead),
  dog('pharaoh-hound', 'Pharaoh hound', 248, 18, 27, 'smooth', smooth, longHead),
  dog('harrier', 'Harrier', 295, 18, 28, 'smooth', smooth, { undercoat: true }),
  dog('puggle', 'Pug × beagle', null, 7, 14, 'smooth', smooth, { undercoat: true }),

  // Corded, hairless
  dog('puli', 'Puli', 55, 10, 15, 'corded', ['corded-bath'], { undercoat: true }),
  dog('komondor', 'Komondor', 53, 36, 58, 'corded', ['corded-bath'], { undercoat: true }),
  dog('bergamasco', 'Bergamasco shepherd dog', 194, 26, 38, 'corded', ['corded-bath'], {
    undercoat: true,
  }),
  dog('chinese-crested', 'Chinese crested dog, hairless', 288, 3.2, 5.5, 'hairless', ['skin-bath']),
  dog('xoloitzcuintle', 'Xoloitzcuintle, medium', 234, 8, 16, 'hairless', ['skin-bath']),
  dog('peruvian-hairless', 'Peruvian hairless dog, medium', 310, 8, 14, 'hairless', ['skin-bath']),

  // Cats
  cat('domestic-short-hair', 'Domestic short-hair', 3.2, 5.5, 'catShort'),
  cat('domestic-long-hair', 'Domestic long-hair', 3.2, 6, 'catLong'),
  cat('persian', 'Persian', 3, 5.5, 'catLong', { shortNosed: true }),
  cat('exotic-shorthair', 'Exotic shorthair', 3, 5.5, 'catShort', { shortNosed: true }),
  cat('himalayan', 'Himalayan', 3, 5.5, 'catLong', { shortNosed: true }),
  cat('maine-coon', 'Maine Coon', 4.5, 8.5, 'catLong'),
  cat('norwegian-forest-cat', 'Norwegian forest cat', 3.8, 7.5, 'catLong'),
  cat('siberian-cat', 'Siberian cat', 3.8, 7.5, 'catLong'),
  cat('ragdoll', 'Ragdoll', 4, 8, 'catLong'),
  cat('birman', 'Birman', 3, 5.5, 'catLong'),
  cat('turkish-angora', 'Turkish Angora', 2.5, 5, 'catLong'),
  cat('british-shorthair', 'British shorthair', 3.5, 7, 'catShort'),
  cat('siamese', 'Siamese', 2.5, 5, 'catShort'),
  cat('bengal', 'Bengal', 3.5, 6.5, 'catShort'),
  cat('russian-blue', 'Russian blue', 2.8, 5.2, 'catShort'),
  cat('scottish-fold', 'Scottish fold', 2.8, 5.5, 'catShort'),
  cat('abyssinian', 'Abyssinian', 2.8, 4.8, 'catShort'),
  cat('american-shorthair', 'American shorthair', 3.3, 6.8, 'catShort'),
  cat('european-shorthair', 'European shorthair', 3.2, 6.5, 'catShort'),
  cat('chartreux', 'Chartreux', 3, 6.5, 'catShort'),
  cat('burmese', 'Burmese', 3, 5.8, 'catShort'),
  cat('tonkinese', 'Tonkinese', 2.7, 5.5, 'catShort'),
  cat('oriental-shorthair', 'Oriental shorthair', 2.5, 5, 'catShort'),
  cat('devon-rex', 'Devon rex', 2.3, 4.5, 'catShort'),
  cat('cornish-rex', 'Cornish rex', 2.3, 4.5, 'catShort'),
  cat('egyptian-mau', 'Egyptian mau', 2.7, 5, 'catShort'),
  cat('ocicat', 'Ocicat', 3, 6.5, 'catShort'),
  cat('manx', 'Manx', 3, 5.5, 'catShort'),
  cat('munchkin', 'Munchkin', 2.2, 4.2, 'catShort'),
  cat('ragamuffin', 'Ragamuffin', 4, 8.5, 'catLong'),
  cat('somali', 'Somali', 2.8, 5, 'catLong'),
  cat('balinese', 'Balinese', 2.5, 5, 'catLong'),
  cat('turkish-van', 'Turkish van', 3.2, 7.5, 'catLong'),
  cat('british-longhair', 'British longhair', 3.5, 7, 'catLong'),
  cat('selkirk-rex', 'Selkirk rex, long-haired', 3.2, 6.8, 'catLong'),
  cat('sphynx', 'Sphynx', 2.8, 5, 'hairless'),
];

const byId = new Map(breeds.map((breed) => [breed.id, breed]));

/**
 * The breed with this id.
 * @throws RangeError naming the field when no breed has it.
 */
export function findBreed(breedId: string): BreedFacts {
  const breed = byId.get(breedId);
  if (!breed) {
    throw new RangeError(
      `breedId "${breedId}" is not in the breed table; use one of its ids, or null with a weight and a coat type.`,
    );
  }
  return breed;
}

/** The breed's middle weight: the geometric middle of its range, because weights scatter by ratio. */
export function middleGrams(breed: Pick<BreedFacts, 'minGrams' | 'maxGrams'>): number {
  return Math.round(Math.sqrt(breed.minGrams * breed.maxGrams));
}

interface Extras {
  undercoat?: boolean;
  shortNosed?: boolean;
  /** A breed of its own that the FCI does not list: no cross. */
  unlisted?: boolean;
  headShape?: HeadShape;
  regionPermille?: Partial<Record<Region, number>>;
}

function dog(
  id: string,
  name: string,
  fciNumber: number | null,
  minKg: number,
  maxKg: number,
  coatType: CoatType,
  usualStyleIds: readonly string[],
  extras: Extras = {},
): BreedFacts {
  return {
    id,
    name,
    species: 'dog',
    fciNumber,
    minGrams: Math.round(minKg * 1000),
    maxGrams: Math.round(maxKg * 1000),
    coatType,
    undercoat: extras.undercoat ?? (coatType === 'double' || coatType === 'wire'),
    cross: fciNumber === null && !extras.unlisted,
    headShape: extras.shortNosed ? 'short' : (extras.headShape ?? 'medium'),
    shortNosed: extras.shortNosed ?? false,
    regionPermille: extras.regionPermille ?? {},
    usualStyleIds,
  };
}

function cat(
  id: string,
  name: string,
  minKg: number,
  maxKg: number,
  coatType: CoatType,
  extras: Extras = {},
): BreedFacts {
  const usual =
    coatType === 'hairless'
      ? ['cat-skin-bath', 'cat-nails']
      : coatType === 'catLong'
        ? ['cat-comb-out', 'cat-bath-and-comb', 'cat-body-clip']
        : ['cat-comb-out', 'cat-bath-and-comb', 'cat-nails'];
  return {
    ...dog(id, name, null, minKg, maxKg, coatType, usual, extras),
    species: 'cat',
    cross: false,
    undercoat: extras.undercoat ?? coatType === 'catLong',
  };
}
