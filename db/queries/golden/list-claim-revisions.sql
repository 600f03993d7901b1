select `claim_revisions`.`revision` as `revision`, `claim_revisions`.`content` as `content`, `claim_revisions`.`decision` as `decision`, `claim_revisions`.`proposed_decision` as `proposedDecision`, `claim_revisions`.`received_at` as `receivedAt`, `claim_revisions`.`source` as `source`, `people`.`name` as `personName`, `push_keys`.`label` as `keyLabel`
from (select * from claims where branch_id in (select value from json_each(?))) as `claims`
inner join (select * from jobs where branch_id in (select value from json_each(?))) as `jobs` on `jobs`.`id` = `claims`.`job_id`
inner join `branches` on `branches`.`id` = `claims`.`branch_id`
inner join `claim_revisions` on `claim_revisions`.`claim_id` = `claims`.`id` left join `people` on `people`.`id` = `claim_revisions`.`person_id` left join `push_keys` on `push_keys`.`id` = `claim_revisions`.`push_key_id`
where `branches`.`code` = ? and `claims`.`claim_ref` = ? and `jobs`.`voided_at` is null
order by `claim_revisions`.`revision` asc;
