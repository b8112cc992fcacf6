import { Column, Entity, PrimaryColumn } from 'typeorm';
import { ID, NAME, TIME } from '../columns.js';

/** A forge: what designs, stock and members belong to. */
@Entity('shop')
export class Shop {
  @PrimaryColumn(ID)
  id!: string;

  @Column(NAME)
  name!: string;

  @Column(TIME)
  createdAt!: string;
}
