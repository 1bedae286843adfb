import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Triggers that keep what a measurement rests on as it was, whoever asks; and the storage of bytes. */
export class RefuseChanges1796101260000 implements MigrationInterface {
  name = 'RefuseChanges1796101260000';

  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(`
      create function refuse_change() returns trigger language plpgsql as $$
      begin
        raise exception 'a row of % never changes', tg_table_name using errcode = 'integrity_constraint_violation';
      end $$`);
    await queryRunner.query(`
      create trigger tr_bench_revision_never_changes before update or delete on bench_revision
        for each row execute function refuse_change()`);
    await queryRunner.query(`
      create trigger tr_measurement_finished_never_changes before update or delete on measurement
        for each row when (old.finished_at is not null) execute function refuse_change()`);
    await queryRunner.query(`
      create trigger tr_profile_never_changes before update or delete on profile
        for each row execute function refuse_change()`);
    await queryRunner.query(`
      create trigger tr_frame_chunk_never_changes before update on frame_chunk
        for each row execute function refuse_change()`);
    await queryRunner.query(`
      create trigger tr_frame_file_never_changes before update on frame
        for each row when (
          old.laboratory_id <> new.laboratory_id
          or (old.state <> 'storing' and (
            new.state = 'storing' or old.sha256 is distinct from new.sha256
            or old.byte_size <> new.byte_size or old.chunk_count <> new.chunk_count
          ))
        ) execute function refuse_change()`);
    // Out of line and uncompressed: slices are read without fetching the whole value, and frames hardly compress.
    await queryRunner.query('alter table frame_chunk alter column bytes set storage external');
    await queryRunner.query('alter table rendition alter column bytes set storage external');
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query('alter table rendition alter column bytes set storage extended');
    await queryRunner.query('alter table frame_chunk alter column bytes set storage extended');
    await queryRunner.query('drop trigger tr_frame_file_never_changes on frame');
    await queryRunner.query('drop trigger tr_frame_chunk_never_changes on frame_chunk');
    await queryRunner.query('drop trigger tr_profile_never_changes on profile');
    await queryRunner.query('drop trigger tr_measurement_finished_never_changes on measurement');
    await queryRunner.query('drop trigger tr_bench_revision_never_changes on bench_revision');
    await queryRunner.query('drop function refuse_change()');
  }
}
