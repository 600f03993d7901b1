select `branch_id` as `branchId`, json_group_array(normed_ml) as used, json_group_array(norm_ml) as foreseen
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `norm_ml` > ?
group by `branch_id`;
