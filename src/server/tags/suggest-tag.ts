import type { Tag, TagSuggestion } from '../../../shared/tags/tags-contract';
import { slugOf } from '../../../shared/tags/tag-search';
import { recordAudit } from '../audit';
import { actorOf, inTransaction, Problem, type Context } from '../platform';
import { insertTag, listTags } from './tags-queries';

/** A member suggests a tag; it can be chosen by its suggester at once and by others when a coordinator approves it. */
export function suggestTag(ctx: Context, form: TagSuggestion): Promise<Tag> {
  return inTransaction(ctx, async (tx) => {
    const slug = slugOf(form.label);
    const same = (await listTags(tx.db)).find(
      (tag) => tag.slug === slug || tag.synonyms.some((synonym) => slugOf(synonym) === slug),
    );
    if (!slug || same)
      throw new Problem(
        'conflict',
        same ? `This tag exists already as “${same.label}”` : 'Use letters or digits in the name',
        {
          fields: [{ field: 'label', message: same ? `Exists already as “${same.label}”` : 'Use letters or digits' }],
        },
      );
    const tag = { slug, kind: form.kind, label: form.label, synonyms: [], parentId: null, state: 'suggested' as const };
    const id = await insertTag(tx.db, { ...tag, suggestedBy: actorOf(tx).personId, createdAt: tx.now() });
    if (!id) throw new Problem('conflict', 'Somebody suggested this tag at the same moment');
    await recordAudit(tx, { action: 'tags.suggest', subjectId: id });
    return { id, ...tag };
  });
}
