select `branches`.`code` as `branch`, `people`.`name` as `by`, `imports`.`id` as `id`, `imports`.`branch_id` as `branchId`, `imports`.`kind` as `kind`, `imports`.`file_name` as `fileName`, `imports`.`stored_file` as `storedFile`, `imports`.`bytes` as `bytes`, `imports`.`sha256` as `sha256`, `imports`.`received_at` as `receivedAt`, `imports`.`person_id` as `personId`, `imports`.`state` as `state`, `imports`.`counts` as `counts`, `imports`.`rows_done` as `rowsDone`, `imports`.`rows_of` as `rowsOf`, `imports`.`written` as `written`, `imports`.`ended_at` as `endedAt`, `imports`.`problem` as `problem`
from (select * from imports where branch_id in (select value from json_each(?))) as `imports`
inner join `branches` on `branches`.`id` = `imports`.`branch_id`
inner join `people` on `people`.`id` = `imports`.`person_id`
where `branches`.`code` = ?
order by `imports`.`received_at` desc, `imports`.`id` desc
limit ?;
