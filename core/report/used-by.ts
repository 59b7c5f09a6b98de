import { parseUnit } from '../units/parse-unit.ts';
import { ATMOSPHERE_PATH } from './draft.ts';
import type { Block, Report } from './model.ts';

/** Paths of the blocks that a block rests on: a column of gases on its gases, a gauge reading on the atmosphere. */
export function usedBy(block: Block, { quantities }: Report): readonly string[] {
  if ('uses' in block) return block.uses;
  if (block.block === 'column')
    return block.holds === 'gas' ? [...new Set(block.cells.map((gas) => `gases/${gas}`))] : [];
  if (block.block !== 'input' && block.block !== 'taken') return [];
  const unit = Object.hasOwn(quantities, block.name) ? quantities[block.name]?.unit : undefined;
  return block.path !== ATMOSPHERE_PATH && parseUnit(unit ?? '')?.gauge === true ? [ATMOSPHERE_PATH] : [];
}
