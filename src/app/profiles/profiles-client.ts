import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import { map, type Observable } from 'rxjs';
import {
  MentoringProfile,
  type PeopleFound,
  type ProfileSection,
  PublicProfile,
  type SavedSection,
} from '../../../shared/profiles/profiles-contract';
import { type Tag, TagList, type TagSuggestion } from '../../../shared/tags/tags-contract';

/** Every HTTP call of mentoring profiles, with the vocabulary they choose from. */
@Injectable({ providedIn: 'root' })
export class ProfilesClient {
  private readonly http = inject(HttpClient);

  mine() {
    return httpResource(() => '/api/profiles/mine', { parse: MentoringProfile.parse });
  }

  profile(personId: Signal<string>) {
    return httpResource(() => `/api/profiles/${personId()}`, { parse: PublicProfile.parse });
  }

  save(section: ProfileSection, content: object, version: number): Observable<SavedSection> {
    return this.http.put<SavedSection>(`/api/profiles/mine/${section}`, content, {
      headers: { 'If-Match': `"${version}"` },
    });
  }

  tags() {
    return httpResource(() => '/api/tags', { parse: TagList.parse });
  }

  suggestTag(form: TagSuggestion): Observable<Tag> {
    return this.http.post<Tag>('/api/tags/suggestions', form);
  }

  searchPeople(text: string): Observable<PeopleFound['people']> {
    return this.http.get<PeopleFound>('/api/profiles/search', { params: { text } }).pipe(map((found) => found.people));
  }
}
