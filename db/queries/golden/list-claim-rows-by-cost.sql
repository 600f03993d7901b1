select `claims`.`claim_ref`, `claims`.`revision`, `claims`.`made_on`, `claims`.`zone`, `claims`.`side`, `claims`.`cause`, `claims`.`decision`, `claims`.`proposed_decision`, `claims`.`decided_on`, `claims`.`paid_on`, `claims`.`labour_minutes`, `claims`.`product_ml`, `claims`.`cost_cents`, `job_facts`.`job_ref`, `job_facts`.`make`, `job_facts`.`model`, `job_facts`.`body_type`, `job_facts`.`first_registered`, `job_facts`.`completed_on`, `job_facts`.`warranty_months`, `branches`.`code` as `branch`, `packages`.`code` as `package`, (made_on <= ? and job_facts.warranty_months > 0 and made_on <= date(job_facts.completed_on, '+' || job_facts.warranty_months || ' months', 'floor') and (decision <> 'refused' or coalesce(decided_on > ?, false))) as counted, -cost_cents as "sortKey"
from (select * from claims where branch_id in (select value from json_each(?))) as `claims`
inner join (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts` on `job_facts`.`job_id` = `claims`.`job_id`
inner join `branches` on `branches`.`id` = `claims`.`branch_id`
inner join `packages` on `packages`.`id` = `job_facts`.`package_id`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?))
order by "sortKey", completed_on desc, branches.code, job_ref, claim_ref
limit ?;
