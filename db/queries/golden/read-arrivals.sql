select `branches`.`id` as `branchId`, `branches`.`closed_on` as `closedOn`, json_group_array(arrived.hour) as hours
from (select distinct `job_facts`.`branch_id` as `branch_id`, substr(r.received_at, 1, 13) as hour from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts` inner join `job_revisions` as `r` on `r`.`job_id` = `job_facts`.`job_id` where `r`.`revision` = ? and `job_facts`.`completed_on` >= ?) as `arrived`
inner join `branches` on `branches`.`id` = `arrived`.`branch_id`
group by `branches`.`id`
order by `branches`.`id` asc;
