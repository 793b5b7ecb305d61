import type { DemoKitItem } from './shapes';

const item = (
  slug: string,
  name: string,
  withoutText: string,
  otherNames: readonly string[],
  loadMatters = false,
): DemoKitItem => ({ slug, name, otherNames, withoutText, loadMatters });

/** What the Apple Loft knows as kit. A bar to hang from is "the beam" there. */
export const kitItems = [
  item('bar', 'bar to hang from', 'nothing to hang from', ['the beam', 'pull-up bar', 'chin-up bar', 'bar']),
  item('rings', 'rings', 'no rings', ['gymnastic rings', 'ring straps']),
  item('box', 'box', 'no box', ['apple crate', 'crate', 'jump box', 'bench']),
  item('step', 'low step', 'no step', ['stair', 'bottom stair', 'aerobic step']),
  item('dumbbell', 'dumbbell', 'no dumbbell', ['hand weight', 'DB'], true),
  item('kettlebell', 'kettlebell', 'no kettlebell', ['bell', 'KB'], true),
  item('band', 'long band', 'no long band', ['loop band', 'resistance band', 'strong band']),
  item('mini-band', 'mini band', 'no mini band', ['knee band', 'short loop']),
  item('rope', 'rope', 'no rope', ['skipping rope', 'jump rope']),
  item('mat', 'mat', 'no mat', ['exercise mat', 'folded blanket']),
  item('towel', 'towel', 'no towel', ['bath towel', 'sheet']),
  item('door', 'door that shuts', 'no door that shuts', ['door', 'solid door']),
  item('chair', 'steady chair', 'no steady chair', ['chair', 'sofa edge']),
  item('wall', 'clear wall', 'no clear wall', ['wall']),
  item('backpack', 'packed backpack', 'no backpack', ['rucksack', 'bag of books'], true),
  item('broomstick', 'broomstick', 'no broomstick', ['dowel', 'stick', 'broom']),
] as const satisfies readonly DemoKitItem[];
