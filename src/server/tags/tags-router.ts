import { Tag, TagList, TagSuggestion } from '../../../shared/tags/tags-contract';
import { route, type Route } from '../platform';
import { suggestTag } from './suggest-tag';
import { listTags } from './tags-queries';

export const tagsRoutes: Route[] = [
  route({
    method: 'get',
    path: '/api/tags',
    may: ['anyone'],
    summary: 'The vocabulary of interest tags',
    answer: TagList,
    handle: async (ctx) => ({ tags: await listTags(ctx.db) }),
  }),
  route({
    method: 'post',
    path: '/api/tags/suggestions',
    may: ['member'],
    summary: 'Suggest a tag',
    body: TagSuggestion,
    answer: Tag,
    status: 201,
    handle: (ctx, { body }) => suggestTag(ctx, body),
  }),
];
