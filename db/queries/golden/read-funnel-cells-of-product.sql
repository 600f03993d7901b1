select branch_id as "branchId", package_id * 8 + age_band as key, count(*) as cars, sum(norm_ml) as e, sum(1.0 * normed_ml * normed_ml) as aa, sum(1.0 * normed_ml * norm_ml) as ae, sum(1.0 * norm_ml * norm_ml) as ee, sum(normed_ml) as part0
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `norm_ml` > ?
group by 1, 2;
