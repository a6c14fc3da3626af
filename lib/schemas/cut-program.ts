/** The core's cut program as JSON, as it is frozen in an order. */
import { z } from "zod";
import type { CutProgram } from "@/lib/layout";
import { allowanceUmSchema, rectSchema, umSchema } from "./length";
import { sawKinds, sawLimitsSchema } from "./saw-limits";

export const machineSchema = z.object({
  id: z.string(),
  name: z.string(),
  kind: z.enum(sawKinds),
  kerf: allowanceUmSchema,
  cleanUp: allowanceUmSchema,
  limits: sawLimitsSchema,
});

export const edgeSchema = z.enum(["left", "right", "top", "bottom"]);
export const edgeStateSchema = z.enum(["rough", "marked", "trued", "sawn"]);

export const partSchema = z.object({
  id: z.string(),
  kind: z.enum(["board", "rough", "strip", "blank", "piece", "offcut", "waste"]),
  label: z.string().nullable(),
  pieceId: z.string().nullable(),
  rect: rectSchema,
});

export const cutStepSchema = z.object({
  number: z.int(),
  kind: z.enum(["true", "plane", "flatten", "rip", "crosscut"]),
  stage: z.literal("rough").optional(),
  machineId: z.string().optional(),
  blade: allowanceUmSchema.optional(),
  part: partSchema,
  fromEdge: edgeSchema,
  fromEdgeState: edgeStateSchema,
  setting: umSchema,
  bladeSide: z.enum(["near", "far"]),
  kerf: rectSchema,
  yields: z.array(partSchema),
  trim: z.boolean(),
  settingNumber: z.int(),
  turn: z.enum(["none", "quarter", "end-for-end"]),
  cautions: z.array(
    z.enum([
      "short-crosscut-clamp",
      "narrow-rip-push-stick",
      "guard-and-riving-knife",
      "offcut-not-between-fence-and-blade",
      "too-short-for-planer",
      "no-machine",
      "not-flat",
    ]),
  ),
});

/** Whole µm². */
const areaSchema = z.int().min(0);

export const cutProgramSchema = z.object({
  steps: z.array(cutStepSchema),
  kerf: z.object({ rip: umSchema, crosscut: umSchema }),
  machines: z.array(machineSchema).optional(),
  cleanUps: z.array(z.object({ partId: z.string(), edge: edgeSchema, amount: umSchema })),
  pieces: z.array(partSchema),
  offcuts: z.array(partSchema),
  waste: z.array(partSchema),
  conservation: z.object({
    stock: areaSchema,
    pieces: areaSchema,
    kerf: areaSchema,
    cleanUp: areaSchema,
    offcuts: areaSchema,
    waste: areaSchema,
  }),
  settings: z.int(),
  search: z.object({ steps: z.int(), proven: z.boolean() }),
});

/** Fails to compile when the frozen shape and the core drift apart. */
export const cutProgramForCore = (program: z.output<typeof cutProgramSchema>): CutProgram => program;
