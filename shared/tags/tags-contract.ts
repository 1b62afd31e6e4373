/** Interest tags: a managed vocabulary of practice areas and topics. */
import { z } from 'zod';

export const TagKind = z.enum(['practice-area', 'topic']);
export type TagKind = z.infer<typeof TagKind>;
export const TagState = z.enum(['suggested', 'approved', 'retired']);
export type TagState = z.infer<typeof TagState>;

export const Tag = z.object({
  id: z.uuid(),
  slug: z.string(),
  kind: TagKind,
  label: z.string(),
  synonyms: z.array(z.string()),
  parentId: z.uuid().nullable(),
  state: TagState,
});
export type Tag = z.infer<typeof Tag>;
export const TagList = z.object({ tags: z.array(Tag) });
export type TagList = z.infer<typeof TagList>;

export const TagSuggestion = z.strictObject({
  label: z.string().trim().min(2, 'At least 2 characters').max(60, 'At most 60 characters').normalize('NFC'),
  kind: TagKind,
});
export type TagSuggestion = z.infer<typeof TagSuggestion>;
