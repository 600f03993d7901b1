select `m`.`status` as `status`, `m`.`due_on` as `dueOn`, `m`.`note` as `note`, `m`.`owner_told_on` as `ownerToldOn`, `people`.`name` as `changedBy`, `m`.`changed_at` as `changedAt`
from (select * from come_back_marks where branch_id in (select value from json_each(?))) as `m`
inner join `people` on `people`.`id` = `m`.`person_id`
where `m`.`job_id` = ? and `m`.`ref` = ?
order by `m`.`revision` asc;
