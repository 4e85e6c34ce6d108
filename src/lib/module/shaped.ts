import { lumpedResponse } from './constant';
import { SHAPES, shapeAt } from './shapes';
import type { ModuleConstants, ModuleResponse } from './types';

/** α, R and K at a temperature (K) from their values at 300.15 K, by the published shapes of Bi2Te3 (see `shapes.ts`). */
export const constantsAt = ({ alpha, R, K }: ModuleConstants, T: number): ModuleConstants => ({
  alpha: alpha * shapeAt(SHAPES.alpha, T),
  R: R * shapeAt(SHAPES.R, T),
  K: K * shapeAt(SHAPES.K, T),
});

/**
 * Heat and voltage by the equations of three constants, each taken at the mean of both faces: α at the mean temperature already holds most of the
 * Thomson heat. Derivatives are by α, R, K at 300.15 K and by the current; I in A, faces in K.
 */
export function shapedResponse(constants: ModuleConstants, I: number, Tc: number, Th: number): ModuleResponse {
  const mean = (Tc + Th) / 2;
  const found = lumpedResponse(constantsAt(constants, mean), I, Tc, Th);
  const shapes = [shapeAt(SHAPES.alpha, mean), shapeAt(SHAPES.R, mean), shapeAt(SHAPES.K, mean)] as const;
  const shaped = ([a, r, k]: ModuleResponse['heatBy']) => [a * shapes[0], r * shapes[1], k * shapes[2]] as const;
  return { ...found, heatBy: shaped(found.heatBy), voltageBy: shaped(found.voltageBy) };
}
