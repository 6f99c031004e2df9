import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { PersonRoleRow } from './models/person-role-row';
import { PersonRow } from './models/person-row';
import { PeopleService } from './people.service';

@Module({
  imports: [SequelizeModule.forFeature([PersonRow, PersonRoleRow])],
  providers: [PeopleService],
  exports: [PeopleService],
})
export class PeopleModule {}
