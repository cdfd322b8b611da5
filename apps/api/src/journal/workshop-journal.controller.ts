import { Controller, Req, Res } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { PostPictures } from './post-pictures.js';
import { ShowPosts } from './show-posts.js';
import { WritePosts } from './write-posts.js';

@Controller()
export class WorkshopJournalController {
  constructor(
    private readonly show: ShowPosts,
    private readonly write: WritePosts,
    private readonly pictures: PostPictures,
  ) {}

  @Endpoint('GET /workshop/posts')
  list(@Input() input: Handled<'GET /workshop/posts'>): Promise<Answer<'GET /workshop/posts'>> {
    return this.show.list(input);
  }

  @Endpoint('POST /workshop/posts')
  draft(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /workshop/posts'>,
  ): Promise<Answer<'POST /workshop/posts'>> {
    return this.write.draft(person, body);
  }

  @Endpoint('GET /workshop/posts/:postId')
  read(
    @Input() { params }: Handled<'GET /workshop/posts/:postId'>,
  ): Promise<Answer<'GET /workshop/posts/:postId'>> {
    return this.show.one(params.postId);
  }

  @Endpoint('PUT /workshop/posts/:postId')
  change(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /workshop/posts/:postId'>,
  ): Promise<Answer<'PUT /workshop/posts/:postId'>> {
    return this.write.change(person, params.postId, body);
  }

  @Endpoint('DELETE /workshop/posts/:postId')
  delete(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /workshop/posts/:postId'>,
  ): Promise<void> {
    return this.write.delete(person, params.postId);
  }

  @Endpoint('POST /workshop/posts/:postId/publication')
  publish(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'POST /workshop/posts/:postId/publication'>,
  ): Promise<Answer<'POST /workshop/posts/:postId/publication'>> {
    return this.write.publish(person, params.postId);
  }

  @Endpoint('DELETE /workshop/posts/:postId/publication')
  takeBack(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /workshop/posts/:postId/publication'>,
  ): Promise<Answer<'DELETE /workshop/posts/:postId/publication'>> {
    return this.write.takeBack(person, params.postId);
  }

  @Endpoint('POST /workshop/posts/:postId/pictures')
  addPicture(
    @Input() { params }: Handled<'POST /workshop/posts/:postId/pictures'>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Answer<'POST /workshop/posts/:postId/pictures'>> {
    return this.pictures.add(params.postId, request, response);
  }

  @Endpoint('DELETE /workshop/posts/:postId/pictures/:pictureId')
  removePicture(
    @Input() { params }: Handled<'DELETE /workshop/posts/:postId/pictures/:pictureId'>,
  ): Promise<void> {
    return this.pictures.remove(params.postId, params.pictureId);
  }
}
