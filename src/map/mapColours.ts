/**
 * The ground's own colours: paper, water and green a shade quieter than the tokens, so that runs and
 * stops stand out. Canvas cannot read custom properties, hence plain values.
 */
export const MAP = {
  paper: '#f6f1e7',
  built: '#f2ebdd',
  yard: '#eae2d3',
  farm: '#f3eedb',
  grass: '#e8ecd6',
  wood: '#dae4cb',
  park: '#d9e7cc',
  pitch: '#cfe0bf',
  sand: '#f3e6c6',
  pier: '#e4d9c7',
  water: '#cfe3e1',
  waterEdge: '#b9d5d2',
  building: '#e9ddcc',
  buildingEdge: '#dccdb8',
  road: '#ffffff',
  roadMain: '#fffdf8',
  trunk: '#fbe6c9',
  trunkEdge: '#e3c496',
  roadEdge: '#e0d4c1',
  path: '#d8c9b2',
  rail: '#cdc3b4',
  bridgeEdge: '#b8a98f',
  text: '#20302d',
  streetText: '#5c6357',
  quietText: '#77807a',
  waterText: '#56827e',
  greenText: '#5f7a4d',
} as const;

export const MAP_FONT = '"Work Sans Variable", "Work Sans", system-ui, sans-serif';
