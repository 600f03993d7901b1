select `branch_id` as `branchId`, `job_ref` as `ref`, `completed_on` as `completedOn`, iif(costed = 1, labour_cents + repair_labour_cents + product_cents + consumables_cents + bought_in_cents, null) as `costCents`
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `billed` = ? and `completed_on` < ?
order by `completed_on` asc, `job_id` asc;
