import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { SupportersModule } from '../supporters/supporters.module.js';
import { Feeds } from './feeds.js';
import { JournalController } from './journal.controller.js';
import { JournalPageHeads } from './journal-page-heads.js';
import { PostPicture } from './post-picture.model.js';
import { PostPictures } from './post-pictures.js';
import { Post } from './post.model.js';
import { ReadJournal } from './read-journal.js';
import { ShowPosts } from './show-posts.js';
import { WorkshopJournalController } from './workshop-journal.controller.js';
import { WritePosts } from './write-posts.js';

@Module({
  imports: [
    AccountsModule,
    CatalogueModule,
    SupportersModule,
    SequelizeModule.forFeature([Post, PostPicture]),
  ],
  controllers: [JournalController, WorkshopJournalController],
  providers: [ReadJournal, ShowPosts, WritePosts, PostPictures, Feeds, JournalPageHeads],
})
export class JournalModule {}
