select `branches`.`code` as `branch`, `week` as `week`, `text` as `text`, `people`.`name` as `by`, `changed_at` as `changedAt`
from (select * from week_notes where branch_id in (select value from json_each(?))) as `week_notes`
inner join `branches` on `branches`.`id` = `week_notes`.`branch_id`
inner join `people` on `people`.`id` = `week_notes`.`person_id`
where `week` between ? and ?
order by `week` desc, `branches`.`code` asc;
