select count(*) as `jobs`
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and substr(model_key, 1, length(?)) = ? and substr(model_key, -length(?)) = ? and `age_band` = ? and `billed` = ? and `has_rot` = ? and `has_estimate` = ? and instr(search_text, ?) > 0;
