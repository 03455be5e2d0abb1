import { placesOf } from '../place-maker'

export const PLACES = placesOf('m', [
  { key: 'lounge', name: 'Lounge', holds: { 'tv-bench': 'TV bench', alcove: 'alcove' } },
  { key: 'box-room', name: 'Box room', holds: { 'box-1': 'box 1', 'box-2': 'box 2' } },
  { key: 'shed', name: 'Shed', holds: { 'shed-shelf': 'shelf' } },
  { key: 'kitchen', name: 'Kitchen', holds: { drawer: 'bottom drawer' } },
  { key: 'chimney', name: 'Chimney' },
])
