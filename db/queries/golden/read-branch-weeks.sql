select `branch_id` as `branchId`, `week` as `week`, count(*) as cars, sum(margin_cents) as a, sum(revenue_cents) as e
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `billed` = ? and `costed` = ?
group by `branch_id`, `week`
order by `branch_id` asc, `week` asc;
