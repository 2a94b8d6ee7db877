import type { Random } from './seededRandom.ts';
import type { Settlement } from './settlements.ts';

const words = (text: string) => text.trim().split(/\s+/);

const STEMS: Readonly<Record<Settlement['theme'], readonly string[]>> = {
  sea: words(`Anchor Barnacle Beacon Bollard Bosun Bowline Breakwater Buoy Capstan Cockle Coral Crab
    Cuttle Driftwood Ebb Foghorn Gansey Halyard Herring Jetty Kelp Lantern Limpet Lobster Mackerel
    Mariner Mizzen Mussel Net Oyster Pebble Periwinkle Pilchard Pilot Prawn Rigging Sandbar Scallop
    Seagrass Shingle Shrimp Spindrift Starfish Surf Tideway Trawler Urchin Whelk Windlass Wrack`),
  trade: words(`Baker Basket Brewer Brick Candle Carter Chandler Cobbler Cooper Cutler Dyer Draper
    Farrier Fletcher Fuller Glazier Glover Hatter Hooper Joiner Kiln Lace Lime Mason Mercer Miller
    Needle Pewter Plough Potter Quarry Reed Rope Saddler Sail Salter Sawyer Shearer Slate Smith
    Spinner Tallow Tanner Thatcher Tiler Tinker Turner Weaver Wheel Wool`),
  tree: words(`Alder Apple Ash Aspen Beech Birch Blackthorn Bramble Broom Buckthorn Catkin Cedar
    Cherry Chestnut Cob Damson Dogwood Elder Elm Fern Gorse Hawthorn Hazel Heather Holly Hornbeam
    Ivy Juniper Larch Laurel Lime Maple Medlar Mulberry Myrtle Nettle Oak Osier Pear Pine Plum Poplar
    Quince Rowan Sallow Sloe Spindle Sycamore Walnut Willow`),
  bird: words(`Avocet Bittern Bunting Buzzard Chough Cormorant Crake Curlew Dabchick Dipper Dotterel
    Dunlin Egret Eider Falcon Fieldfare Fulmar Gannet Godwit Goshawk Grebe Guillemot Harrier Heron
    Kestrel Kingfisher Kittiwake Knot Lapwing Linnet Martin Merlin Oriole Osprey Petrel Pipit Plover
    Puffin Redshank Sanderling Shearwater Skua Snipe Stint Swift Teal Tern Turnstone Wagtail Wigeon`),
  land: words(`Acre Barley Barn Bracken Bridle Brook Byre Clover Coppice Corn Dairy Drover Fallow Fen
    Flint Ford Furrow Gate Glebe Granary Harrow Hay Hayrick Hedge Hill Hop Lamb Lea Linseed Marl
    Meadow Moor Oat Orchard Paddock Pasture Pound Ridge Rye Sheaf Sheep Shepherd Sickle Spinney
    Stile Straw Tithe Vale Warren Wheat`),
};

const SHORT = ['Close', 'Court', 'Row', 'Yard', 'Mews', 'Place', 'End'];
const MIDDLE = ['Street', 'Lane', 'Gardens', 'Rise', 'Walk', 'Terrace', 'Hill', 'Grove'];
const LONG = ['Road', 'Avenue', 'Drive', 'Way', 'Street', 'Crescent'];
const QUARTERS = ['North', 'South', 'East', 'West', 'Upper', 'Lower'];

/**
 * Hands out street names that sound like their settlement, each once. A name list that runs dry falls
 * back to "Upper …" and then to numbers, so that drawing always ends.
 */
export function streetNames(random: Random) {
  const used = new Set<string>();
  const turns = new Map<string, number>();
  const order = new Map(
    Object.entries(STEMS).map(([theme, stems]) => [theme, shuffled(stems, random)] as const),
  );
  return (theme: Settlement['theme'], metres: number): string => {
    const stems = order.get(theme)!;
    const endings = metres < 160 ? SHORT : metres < 420 ? MIDDLE : LONG;
    const start = turns.get(theme) ?? 0;
    for (let i = 0; i < stems.length * endings.length * 2; i++) {
      const turn = start + i;
      const round = Math.floor(turn / stems.length);
      const ending = endings[(round + turn) % endings.length]!;
      const base = `${stems[turn % stems.length]!} ${ending}`;
      const name = i < stems.length ? base : `${QUARTERS[round % QUARTERS.length]!} ${base}`;
      if (used.has(name)) continue;
      turns.set(theme, turn + 1);
      used.add(name);
      return name;
    }
    const name = `Street ${used.size + 1}`;
    used.add(name);
    return name;
  };
}

function shuffled(list: readonly string[], random: Random): string[] {
  const out = [...list];
  for (let i = out.length - 1; i > 0; i--) {
    const j = Math.floor(random.next() * (i + 1));
    [out[i], out[j]] = [out[j]!, out[i]!];
  }
  return out;
}
