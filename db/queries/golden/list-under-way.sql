select `jobs_under_way`.`job_ref` as `jobRef`, `revision` as `revision`, `content` as `text`, `starter`.`name` as `startedBy`, `started_at` as `startedAt`, `changer`.`name` as `changedBy`, `changed_at` as `changedAt`, (select count(*) from (select * from photos where branch_id in (select value from json_each(?))) as `photos` where photos.branch_id = jobs_under_way.branch_id and photos.job_ref = jobs_under_way.job_ref) as `photos`
from (select * from jobs_under_way where branch_id in (select value from json_each(?))) as `jobs_under_way`
inner join `people` as `starter` on `starter`.`id` = `started_by`
inner join `people` as `changer` on `changer`.`id` = `changed_by`
where `jobs_under_way`.`branch_id` = ?
order by `changed_at` desc, `jobs_under_way`.`job_ref` asc;
