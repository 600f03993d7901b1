select branch_id as "branchId", package_id * 8 + age_band as key, count(*) as cars, sum(1) as e, sum(1.0 * has_rot * has_rot) as aa, sum(1.0 * has_rot * 1) as ae, sum(1.0 * 1 * 1) as ee, sum(has_rot * (age_band = 0)) as part0, sum(has_rot * (age_band = 1)) as part1, sum(has_rot * (age_band = 2)) as part2, sum(has_rot * (age_band = 3)) as part3, sum(has_rot * (age_band = 4)) as part4
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?))
group by 1, 2;
