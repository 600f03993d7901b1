select `photo_ref` as `photo`, `finding_ref` as `finding`, `width` as `width`, `height` as `height`, `bytes` as `bytes`, `received_at` as `receivedAt`, `people`.`name` as `personName`, `push_keys`.`label` as `keyLabel`, `storage_key` as `storageKey`, `sent_hash` as `sentHash`
from (select * from photos where branch_id in (select value from json_each(?))) as `photos` left join `people` on `people`.`id` = `photos`.`person_id` left join `push_keys` on `push_keys`.`id` = `photos`.`push_key_id`
where `photos`.`branch_id` = ? and `job_ref` = ?
order by `photos`.`received_at` asc, `photos`.`photo_ref` asc;
