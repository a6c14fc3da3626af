/** Where the furniture will live: air at its driest and dampest, or the moisture of wood that stands there. */
import { z } from "zod";
import { type Climate, FIBRE_SATURATION, yearlyMoisture } from "@/lib/layout";

/** The table that the equation is checked by has 20 to 85 % and −1 to 32 °C; a little more on either side. */
const airSchema = z.object({
  celsius: z.number().min(-10, "At least −10 °C").max(50, "At most 50 °C"),
  humidity: z.number().min(5, "At least 5 %").max(95, "At most 95 %"),
});
const moistureSchema = z.number().min(0, "At least 0 %").max(FIBRE_SATURATION, `At most ${FIBRE_SATURATION} %`);

export const climateSchema = z
  .discriminatedUnion("kind", [
    z.object({ kind: z.literal("air"), driest: airSchema, dampest: airSchema }),
    z.object({ kind: z.literal("moisture"), driest: moistureSchema, dampest: moistureSchema }),
  ])
  .refine(
    (climate) => {
      const { driest, dampest } = yearlyMoisture(climate);
      return driest <= dampest;
    },
    { message: "The driest is damper than the dampest" },
  );

/** Fails to compile when the wire and the core drift apart. */
export const climateForCore = (climate: z.output<typeof climateSchema>): Climate => climate;
