select `p`.`photo_ref` as `photo`, `p`.`finding_ref` as `finding`, `p`.`width` as `width`, `p`.`height` as `height`, `p`.`bytes` as `bytes`, `p`.`received_at` as `receivedAt`, `people`.`name` as `personName`, `push_keys`.`label` as `keyLabel`, `p`.`storage_key` as `storageKey`, `p`.`sent_hash` as `sentHash`
from (select * from photos where branch_id in (select value from json_each(?))) as `p` left join `people` on `people`.`id` = `p`.`person_id` left join `push_keys` on `push_keys`.`id` = `p`.`push_key_id`
where `p`.`branch_id` = ? and `p`.`job_ref` = ?
order by `p`.`received_at` asc, `p`.`photo_ref` asc;
