import { createCumulativeScratch } from '../fold/fold-cumulative';
import { createEdgeFold, createFoldScratch } from '../fold/fold-edge';
import type { ShareFold } from '../fold/share-fold';
import type { Model, Workspace } from './model';

type Shape = Pick<Model, 'rowCount' | 'kernel' | 'shapeCount' | 'size' | 'levelCount'>;

export function createShareFold({
  rowCount,
  kernel,
  shapeCount,
}: Pick<Shape, 'rowCount' | 'kernel' | 'shapeCount'>): ShareFold {
  return {
    share: new Float64Array(rowCount),
    byShape: Array.from({ length: shapeCount }, () => new Float64Array(rowCount)),
    byScale: new Float64Array(rowCount),
    scratch: createFoldScratch(kernel),
    edge: createEdgeFold(rowCount),
    cumulative: createCumulativeScratch(kernel, shapeCount),
    derivatives: true,
  };
}

export function createWorkspace(model: Shape): Workspace {
  const { rowCount, size, levelCount } = model;
  return {
    fold: createShareFold(model),
    capShare: new Float64Array(rowCount),
    capByStart: new Float64Array(rowCount),
    columns: new Float64Array(levelCount * rowCount),
    predicted: new Float64Array(rowCount),
    residual: new Float64Array(rowCount),
    jacobian: new Float64Array(size * rowCount),
    gram: new Float64Array(levelCount * levelCount),
    moment: new Float64Array(levelCount),
    levels: new Float64Array(levelCount),
    heldLevel: new Uint8Array(levelCount),
  };
}
