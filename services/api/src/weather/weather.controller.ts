import {
  Body,
  Controller,
  Delete,
  Get,
  HttpCode,
  HttpStatus,
  Param,
  Post,
  Query,
  StreamableFile,
  UploadedFile,
  UseInterceptors,
} from '@nestjs/common';
import {
  ApiBearerAuth,
  ApiBody,
  ApiConsumes,
  ApiNoContentResponse,
  ApiOkResponse,
  ApiProduces,
  ApiTags,
} from '@nestjs/swagger';
import { ARROW_STREAM_TYPE } from '@noonwell/persistence';
import { nameSchema, pageOf, weatherYearSchema, type WeatherYearView } from '@noonwell/schema';
import { createZodDto, ZodResponse } from 'nestjs-zod';
import { z } from 'zod';
import { CurrentPrincipal, type Principal } from '../access/principal';
import { attachment } from '../http/attachment';
import { LimitCostly } from '../http/limits';
import { IdParamsDto, PageQueryDto, type Page } from '../http/paging';
import { ProblemException } from '../http/problem';
import { WeatherFileInterceptor } from './weather-file.interceptor';
import { fileLabel } from './weather-names';
import { WeatherService } from './weather.service';

class WeatherYearDto extends createZodDto(weatherYearSchema) {}
class WeatherYearPageDto extends createZodDto(pageOf(weatherYearSchema)) {}
class UploadFieldsDto extends createZodDto(z.strictObject({ name: nameSchema.optional() })) {}

const BINARY = { schema: { type: 'string', format: 'binary' } } as const;

@ApiTags('weather')
@ApiBearerAuth()
@Controller('weather-years')
export class WeatherController {
  constructor(private readonly weather: WeatherService) {}

  @Get()
  @ZodResponse({ status: HttpStatus.OK, type: WeatherYearPageDto })
  list(
    @CurrentPrincipal() principal: Principal,
    @Query() query: PageQueryDto,
  ): Promise<Page<WeatherYearView>> {
    return this.weather.list(principal, query);
  }

  @Post()
  @LimitCostly()
  @UseInterceptors(WeatherFileInterceptor)
  @ApiConsumes('multipart/form-data')
  @ApiBody({
    schema: {
      type: 'object',
      required: ['file'],
      properties: { file: { type: 'string', format: 'binary' }, name: { type: 'string' } },
    },
  })
  @ZodResponse({ status: HttpStatus.CREATED, type: WeatherYearDto })
  add(
    @CurrentPrincipal() principal: Principal,
    @Body() { name }: UploadFieldsDto,
    @UploadedFile() file?: Express.Multer.File,
  ): Promise<WeatherYearView> {
    if (file === undefined) {
      throw new ProblemException(
        HttpStatus.BAD_REQUEST,
        'No file came along',
        'Send multipart/form-data with the weather file in the field "file".',
        { kind: 'invalid-input', errors: [{ path: 'file', reason: 'a file is needed' }] },
      );
    }
    return this.weather.add(principal, { bytes: file.buffer, fileName: fileLabel(file.originalname), name });
  }

  @Get(':id')
  @ZodResponse({ status: HttpStatus.OK, type: WeatherYearDto })
  get(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<WeatherYearView> {
    return this.weather.get(principal, id);
  }

  @Get(':id/original')
  @ApiProduces('application/octet-stream')
  @ApiOkResponse({ description: 'The uploaded file, byte for byte', ...BINARY })
  async original(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
  ): Promise<StreamableFile> {
    const { fileName, bytes } = await this.weather.original(principal, id);
    return new StreamableFile(bytes, { disposition: attachment(fileName), length: bytes.length });
  }

  @Get(':id/columns')
  @ApiProduces(ARROW_STREAM_TYPE)
  @ApiOkResponse({ description: 'Arrow IPC stream: startLocalMs and the measured channels', ...BINARY })
  async columns(
    @CurrentPrincipal() principal: Principal,
    @Param() { id }: IdParamsDto,
  ): Promise<StreamableFile> {
    const bytes = await this.weather.columns(principal, id);
    return new StreamableFile(bytes, { type: ARROW_STREAM_TYPE, length: bytes.length });
  }

  @Delete(':id')
  @HttpCode(HttpStatus.NO_CONTENT)
  @ApiNoContentResponse({ description: 'Removed' })
  remove(@CurrentPrincipal() principal: Principal, @Param() { id }: IdParamsDto): Promise<void> {
    return this.weather.remove(principal, id);
  }
}
