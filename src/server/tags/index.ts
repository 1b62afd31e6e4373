export { insertTag, listTags } from './tags-queries';
export { suggestTag } from './suggest-tag';
export { tagsRoutes } from './tags-router';
