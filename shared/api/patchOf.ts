import { z } from 'zod';

type WithoutDefault<Field> = Field extends z.ZodDefault<infer Inner> ? Inner : Field;
type PatchShape<Shape extends z.ZodRawShape> = {
  [Key in keyof Shape]: z.ZodOptional<Extract<WithoutDefault<Shape[Key]>, z.ZodType>>;
};

/**
 * The body of a change: every field optional and no default filled in. zod 4 fills a default in
 * under `.partial()`, so a change of one field would silently reset the others.
 */
export function patchOf<Shape extends z.ZodRawShape>(
  object: z.ZodObject<Shape>,
): z.ZodObject<PatchShape<Shape>> {
  const entries = Object.entries(object.shape).map(([key, field]) => [
    key,
    (field instanceof z.ZodDefault
      ? (field.unwrap() as z.ZodType)
      : (field as z.ZodType)
    ).optional(),
  ]);
  return z.object(Object.fromEntries(entries)) as unknown as z.ZodObject<PatchShape<Shape>>;
}
