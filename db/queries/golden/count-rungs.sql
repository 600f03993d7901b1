select `branch_id` as `branchId`, count(*) as package, sum(age_band = ?) as age, sum(age_band = ? and body_type = ?) as body_age, sum(age_band = ? and model_key = ?) as model_age
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`package_id` = ? and `job_facts`.`completed_on` > ? and `job_facts`.`completed_on` <= ? and `act_minutes` > ?
group by `branch_id`;
