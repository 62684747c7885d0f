import { Controller, Get, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { searchQuerySchema, type SearchQuery, type SearchResult } from '@shared/jobs';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { SearchService } from './search.service.js';

@ApiTags('search')
@Controller('search')
export class SearchController {
  constructor(private readonly search: SearchService) {}

  @Get()
  @Needs('jobs.read')
  find(@CurrentActor() actor: Actor, @Query({ schema: searchQuerySchema }) query: SearchQuery): Promise<SearchResult> {
    return this.search.find(actor, query.q);
  }
}
