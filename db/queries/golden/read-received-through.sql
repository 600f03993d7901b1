select branches.value as "branchId", (select max(job_facts.completed_on) from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts` where job_facts.branch_id = branches.value) as day
from json_each(?) as branches;

select `newest`.`branchId` as `branchId`, `job_revisions`.`received_at` as `at`
from (select `jobs`.`branch_id` as `branchId`, max(`job_revisions`.`id`) as `id` from (select * from jobs where branch_id in (select value from json_each(?))) as `jobs` inner join `job_revisions` on `job_revisions`.`job_id` = `jobs`.`id` group by `jobs`.`branch_id`) as `newest`
inner join `job_revisions` on `job_revisions`.`id` = `newest`.`id`;
