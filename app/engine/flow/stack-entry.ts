import type { DirectionalLayer } from "../directional/layer.ts";
import type { NamedLayer } from "../laminate/free-strain.ts";
import { checkLayer, type Layer } from "../laminate/layer.ts";

/** A layer as it is stated, and as it is checked. */
export interface StackEntry extends NamedLayer {
  stated: Layer;
  /** the same with its two directions apart, where they differ */
  directional?: DirectionalLayer;
}

export function stackEntry(stated: Layer, field: string): StackEntry {
  return { stated, field, layer: checkLayer(stated, field) };
}
