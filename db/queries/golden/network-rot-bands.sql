select `branch_id` as `branchId`, `age_band` as `band`, count(*) as `cars`, sum(`has_rot`) as `withRot`
from (select * from job_facts where branch_id in (select id from branches) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as job_facts
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?))
group by `branch_id`, `age_band`;
