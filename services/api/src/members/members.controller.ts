import { Body, Controller, Get, HttpStatus, Param, Patch, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiTags } from '@nestjs/swagger';
import { changeRoleRequestSchema, idSchema, memberSchema, pageOf, type Member } from '@noonwell/schema';
import { createZodDto, ZodResponse } from 'nestjs-zod';
import { z } from 'zod';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { PageQueryDto, type Page } from '../http/paging';
import { MembersService } from './members.service';

class MemberDto extends createZodDto(memberSchema) {}
class MemberPageDto extends createZodDto(pageOf(memberSchema)) {}
class ChangeRoleDto extends createZodDto(changeRoleRequestSchema) {}
class MemberParamsDto extends createZodDto(z.strictObject({ userId: idSchema })) {}

@ApiTags('workspace')
@ApiBearerAuth()
@Controller('workspace/members')
export class MembersController {
  constructor(private readonly members: MembersService) {}

  @Get()
  @ZodResponse({ status: HttpStatus.OK, type: MemberPageDto })
  list(@CurrentPrincipal() principal: Principal, @Query() query: PageQueryDto): Promise<Page<Member>> {
    return this.members.list(principal, query);
  }

  @Patch(':userId')
  @ZodResponse({ status: HttpStatus.OK, type: MemberDto })
  changeRole(
    @CurrentPrincipal() principal: Principal,
    @Param() { userId }: MemberParamsDto,
    @Body() { role }: ChangeRoleDto,
  ): Promise<Member> {
    return this.members.changeRole(principal, userId, role);
  }
}
