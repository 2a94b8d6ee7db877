/** Invented households of Pellan Bay; a town repeats its family names. */
export const familyNames = [
  'Adeyemi', 'Aldous', 'Amaral', 'Anscombe', 'Arkwell', 'Ashdown', 'Bastos', 'Bellweather', 'Bexley', 'Birkett',
  'Brandao', 'Brightsea', 'Cardew', 'Carvalho', 'Castellan', 'Chandra', 'Colbeck', 'Coombe', 'Corriveau', 'Danforth',
  'Darrow', 'Delacourt', 'Dimas', 'Drummond', 'Eastaway', 'Edevane', 'Ekström', 'Elsdon', 'Escobar', 'Fairholme',
  'Farouk', 'Fennimore', 'Fielding', 'Fonseca', 'Garrick', 'Gillespie', 'Goncalves', 'Grainger', 'Greenaway', 'Haddock',
  'Halloran', 'Harbour', 'Hasegawa', 'Hawksworth', 'Heddle', 'Holm', 'Ibarra', 'Ingleby', 'Ishikawa', 'Jardine',
  'Jessop', 'Kapoor', 'Kerridge', 'Kestrel', 'Kovacs', 'Lambourne', 'Larkspur', 'Lindqvist', 'Lobo', 'Lovelace',
  'Maddox', 'Marchetti', 'Marlowe', 'Mbeki', 'Medeiros', 'Merriweather', 'Moreau', 'Nakata', 'Netherby', 'Nightingale',
  'Norcross', 'Oakhill', 'Obi', 'Okafor', 'Oldacre', 'Ostrander', 'Pacheco', 'Pellew', 'Penhale', 'Petrov',
  'Pomeroy', 'Quayle', 'Quillfeather', 'Ramos', 'Redfern', 'Rosewarne', 'Rutledge', 'Saltonstall', 'Sandoval', 'Seabright',
  'Selwyn', 'Silveira', 'Sorensen', 'Stavely', 'Tamura', 'Tavares', 'Teague', 'Thackeray', 'Thornbury', 'Tideswell',
  'Trelawn', 'Umber', 'Underhay', 'Valdez', 'Vane', 'Vasquez', 'Wadsworth', 'Waverley', 'Whitlock', 'Winterbourne',
  'Wraysford', 'Xavier', 'Yarrow', 'Yilmaz', 'Zapata', 'Zeller',
]; // prettier-ignore

export const firstNames = [
  'Abel', 'Alba', 'Amina', 'Anouk', 'Bela', 'Bruno', 'Carys', 'Cato', 'Clara', 'Dario', 'Delia', 'Edda', 'Elias',
  'Esme', 'Farid', 'Flora', 'Gideon', 'Greta', 'Hanna', 'Hugo', 'Ilse', 'Ivo', 'Jonas', 'Juno', 'Kira', 'Lars',
  'Leonie', 'Lucia', 'Mara', 'Milo', 'Nadia', 'Nils', 'Oona', 'Otto', 'Paloma', 'Quentin', 'Rafael', 'Rhea', 'Silas',
  'Sunniva', 'Tessa', 'Tomas', 'Uma', 'Vera', 'Wanda', 'Yusuf', 'Zora',
]; // prettier-ignore

export const petNames = [
  'Acorn', 'Alder', 'Anchor', 'Apollo', 'Bandit', 'Barley', 'Basil', 'Bean', 'Biscuit', 'Bluebell', 'Bosun', 'Bracken',
  'Bramble', 'Briar', 'Brisket', 'Button', 'Captain', 'Cedar', 'Chestnut', 'Chives', 'Cinder', 'Clementine', 'Clover',
  'Cobble', 'Cricket', 'Crumpet', 'Daisy', 'Dapple', 'Dill', 'Domino', 'Echo', 'Ember', 'Fable', 'Fennel', 'Fern',
  'Fidget', 'Fig', 'Finch', 'Flint', 'Freckle', 'Ginger', 'Gull', 'Harbour', 'Hazel', 'Heather', 'Heron', 'Honey',
  'Hopper', 'Indigo', 'Ivy', 'Jasper', 'Juniper', 'Kelp', 'Kipper', 'Lark', 'Laurel', 'Limpet', 'Linnet', 'Lupin',
  'Magpie', 'Mallow', 'Marble', 'Marigold', 'Maple', 'Marlin', 'Mica', 'Minnow', 'Mocha', 'Moss', 'Muffin', 'Nettle',
  'Nimbus', 'Noodle', 'Nutmeg', 'Oakley', 'Olive', 'Onyx', 'Otis', 'Pebble', 'Pepper', 'Pickle', 'Pip', 'Plum',
  'Poppy', 'Puffin', 'Quill', 'Quince', 'Raisin', 'Reed', 'Rook', 'Rosemary', 'Rusty', 'Saffron', 'Sage', 'Scout',
  'Sedge', 'Skipper', 'Smudge', 'Sorrel', 'Sprat', 'Sprout', 'Squid', 'Star', 'Sumac', 'Tansy', 'Tarragon', 'Teasel',
  'Thistle', 'Thyme', 'Tinker', 'Toffee', 'Truffle', 'Tugboat', 'Velvet', 'Waffle', 'Whisker', 'Willow', 'Wren', 'Yew', 'Zephyr',
]; // prettier-ignore

export const accessNotes = [
  'Outdoor tap by the garage.', 'Drive on the left side of the house.', 'Park in the lane, not on the drive.',
  'Ring twice; the bell is faint.', 'Side gate sticks, lift it.', 'Power socket inside the porch.',
  'Turning is tight: back in.', 'Loading bay in front until 11.', '', '', '', '',
]; // prettier-ignore

export const handoverNotes = [
  'Hand back to an adult only.', 'May go back to the empty house, key with the neighbour.', 'Shy at the door: let them come out alone.',
  'Meet at the back door.', '', '', '', '',
]; // prettier-ignore
