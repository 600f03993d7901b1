select `branch_id` as `branchId`, json_group_array(completed_on) as completedOn, json_group_array((package_id * 8 + age_band) * 1024 + warranty_months) as sold
from (select * from job_facts where branch_id in (select id from branches) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as job_facts
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?))
group by `branch_id`;

select `job_facts`.`branch_id` as `branchId`, `job_facts`.`package_id` as `packageId`, `job_facts`.`age_band` as `band`, `job_facts`.`completed_on` as `completedOn`, `job_facts`.`warranty_months` as `warrantyMonths`, `claims`.`made_on` as `madeOn`, `claims`.`decision` as `decision`, `claims`.`decided_on` as `decidedOn`, `claims`.`cause` as `cause`
from (select * from job_facts where branch_id in (select id from branches) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as job_facts
inner join claims on `claims`.`job_id` = `job_facts`.`job_id`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `claims`.`made_on` <= ?;
